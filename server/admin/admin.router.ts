import type { DataSource } from "typeorm";
import {
  adminUser,
  adminUsersQuery,
  auditQuery,
  roleRequest,
  securityEvent,
  serviceHealth,
  suspensionRequest,
} from "../../shared/contract/admin";
import { SecurityLogService } from "../auth/securityLog.service";
import { SessionsService } from "../auth/sessions.service";
import type { Api } from "../http/api";
import { currentUserId } from "../http/currentUser";
import { HttpProblem } from "../http/httpProblem";
import { idIn } from "../http/ownedCollection.router";
import { parse } from "../http/parse";
import { AdminService, type WatchedStore } from "./admin.service";

const tag = "admin";
const user = { name: "AdminUser", schema: adminUser };
const refused = {
  description: "Not an administrator (not-allowed), or one without codes for signing in (second-factor-required).",
};
const missing = { description: "There is no such account (not-found)." };
const oneself = { description: "Nobody does this to their own account (own-account)." };
const wrongQuery = "This cannot be asked for.";

interface AdminSettings {
  tokenSecret: string;
  stores: readonly WatchedStore[];
}

/** People, health and the audit log, for administrators. */
export function adminRoutes(api: Api, dataSource: DataSource, { tokenSecret, stores }: AdminSettings): void {
  const admin = new AdminService(dataSource, stores);
  const sessions = new SessionsService(dataSource);
  const log = new SecurityLogService(dataSource, tokenSecret);
  const common = { tag, signedIn: true } as const;

  /** Whom the address names; never the one who asks. */
  const somebodyElse = async (params: Record<string, string>, byUserId: string) => {
    const { id } = await admin.user(idIn(params, "id", "account"));
    if (id === byUserId) throw new HttpProblem(409, "own-account", "Ask another administrator to do this.");
    return id;
  };

  api.route(
    {
      ...common,
      method: "get",
      path: "/admin/users",
      summary: "People by a part of their address, 50 at a time; after=<last id> gives the next",
      query: adminUsersQuery,
      answers: { 200: { description: "The people.", schema: user, list: true }, 403: refused },
    },
    async (req, res) => {
      const { q = "", after } = parse(adminUsersQuery, req.query, wrongQuery);
      res.json(await admin.users(q, after ?? null));
    },
  );

  api.route(
    {
      ...common,
      method: "put",
      path: "/admin/users/:id/suspension",
      summary: "Suspend an account, which ends its sessions, or let it in again",
      body: { name: "Suspension", schema: suspensionRequest },
      answers: { 200: { description: "Done.", schema: user }, 403: refused, 404: missing, 409: oneself },
    },
    async (req, res) => {
      const { suspended } = parse(suspensionRequest, req.body);
      const byUserId = currentUserId(res);
      const userId = await somebodyElse(req.params, byUserId);
      await admin.suspend(userId, suspended);
      if (suspended) await sessions.endAll(userId);
      await log.note(suspended ? "suspended" : "resumed", { userId, byUserId, address: req.ip });
      res.json(await admin.user(userId));
    },
  );

  api.route(
    {
      ...common,
      method: "put",
      path: "/admin/users/:id/role",
      summary: "Give an account another role",
      body: { name: "RoleChange", schema: roleRequest },
      answers: { 200: { description: "Done.", schema: user }, 403: refused, 404: missing, 409: oneself },
    },
    async (req, res) => {
      const { role } = parse(roleRequest, req.body);
      const byUserId = currentUserId(res);
      const userId = await somebodyElse(req.params, byUserId);
      await admin.setRole(userId, role);
      await log.note("role-changed", { userId, byUserId, address: req.ip });
      res.json(await admin.user(userId));
    },
  );

  api.route(
    {
      ...common,
      method: "get",
      path: "/admin/health",
      summary: "How queue, mail and storage are",
      answers: {
        200: { description: "How they are.", schema: { name: "ServiceHealth", schema: serviceHealth } },
        403: refused,
      },
    },
    async (_req, res) => {
      res.json(await admin.health());
    },
  );

  api.route(
    {
      ...common,
      method: "get",
      path: "/admin/audit",
      summary: "Security events, newest first, 50 at a time; before=<last id> gives the next",
      query: auditQuery,
      answers: {
        200: { description: "The events.", schema: { name: "SecurityEvent", schema: securityEvent }, list: true },
        403: refused,
      },
    },
    async (req, res) => {
      const { userId, before } = parse(auditQuery, req.query, wrongQuery);
      res.json(await admin.audit(userId ?? null, before ?? null));
    },
  );
}
