import type { Router } from "express";
import request from "supertest";
import { startTestServer, type TestServer } from "./testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

interface Document {
  openapi: string;
  paths: Record<
    string,
    Record<string, { operationId: string; security: object[]; requestBody?: object; responses: Record<string, object> }>
  >;
  components: { schemas: Record<string, { type?: string; required?: string[]; properties?: object }> };
}

const document = async () => (await request(server.app).get("/api/openapi.json").expect(200)).body as Document;

/** What Express itself would answer, found by walking through all its layers. */
function walk(stack: Router["stack"]): string[] {
  return stack.flatMap((layer) => {
    if (layer.route) {
      const { path, stack: handlers } = layer.route;
      return [...new Set(handlers.map(({ method }) => `${method} ${path.replace(/:(\w+)/g, "{$1}")}`))];
    }
    const inner = (layer.handle as Partial<Router>).stack;
    return inner ? walk(inner) : [];
  });
}

it("describes every route that the server has, and no other", async () => {
  const { paths } = await document();
  const described = Object.entries(paths).flatMap(([path, methods]) =>
    Object.keys(methods).map((method) => `${method} ${path}`),
  );
  const served = walk((server.app.router as unknown as Router).stack);
  expect(served.length).toBeGreaterThan(25);
  expect(described.sort()).toEqual(served.sort());
});

it("is OpenAPI 3.1 with references that lead somewhere and operation ids that differ", async () => {
  const described = await document();
  expect(described.openapi).toBe("3.1.0");
  const references = [...JSON.stringify(described).matchAll(/"\$ref":"#\/components\/schemas\/([^"]+)"/g)].map(
    ([, name = ""]) => name,
  );
  expect(references.length).toBeGreaterThan(50);
  for (const name of references) expect(described.components.schemas).toHaveProperty(name);
  expect(JSON.stringify(described)).not.toMatch(/"\$schema"|"\$ref":"(?!#\/components)/);
  const ids = Object.values(described.paths).flatMap((methods) =>
    Object.values(methods).map(({ operationId }) => operationId),
  );
  expect(new Set(ids).size).toBe(ids.length);
});

it("tells the truth about who may ask: without a token exactly the guarded operations answer 401", async () => {
  const { paths } = await document();
  for (const [path, methods] of Object.entries(paths)) {
    for (const [method, operation] of Object.entries(methods)) {
      const guarded = operation.security.length > 0;
      expect([path, method, "401" in operation.responses || !guarded]).toEqual([path, method, true]);
      const address = `/api${path.replace(/\{\w+\}/g, "6b273a3d-f63c-4f39-8493-f88da85a1e6a")}`;
      const response = await request(server.app)
        [method as "get"](address)
        .send(method === "put" || method === "post" ? ({} as never) : undefined);
      const refused = response.status === 401 && path !== "/auth/refresh";
      expect([path, method, refused]).toEqual([path, method, guarded]);
    }
  }
});

it("makes its schemas from the contracts", async () => {
  const { schemas } = (await document()).components;
  expect(Object.keys(schemas).sort()).toEqual(
    [
      "Account",
      "Assignment",
      "AssignmentChange",
      "AssignmentListing",
      "AssignmentRequest",
      "Comment",
      "CommentRequest",
      "Consent",
      "GroupKey",
      "GroupRequest",
      "GuardianLook",
      "GuardianRequest",
      "GuardianState",
      "Invite",
      "InviteAcceptance",
      "InviteLook",
      "InviteRequest",
      "Link",
      "MemberChange",
      "NewStudio",
      "Part",
      "PartChange",
      "PartListing",
      "RosterRow",
      "Studio",
      "StudioChange",
      "StudioGroup",
      "AdminUser",
      "Challenge",
      "ChangeEmail",
      "ChangePassword",
      "Code",
      "ConfirmEmail",
      "Erasure",
      "Forgotten",
      "OpenSession",
      "Password",
      "PasswordAndCode",
      "PersonFacts",
      "PersonFactsChange",
      "RecoveryCodes",
      "Reset",
      "RoleChange",
      "SecondFactor",
      "SecondFactorSetup",
      "SecondStep",
      "SecurityEvent",
      "ServiceHealth",
      "SoundLink",
      "Suspension",
      "Arrangement",
      "ChartPdfRequest",
      "Decision",
      "HandIn",
      "HandInRequest",
      "Health",
      "LineUp",
      "MailPreferences",
      "OpenApi",
      "OwnInstrument",
      "PlayerWishes",
      "Problem",
      "Session",
      "SheetPdfRequest",
      "SheetLink",
      "SheetLinkRequest",
      "MadeSheetLink",
      "SharedSheet",
      "SignIn",
      "SignUp",
      "Song",
      "SongPage",
      "SongTag",
      "SongVersion",
      "SongVersionEntry",
      "Take",
      "Try",
      "Unsubscribed",
      "Voice",
    ].sort(),
  );
  expect(schemas.SignUp).toMatchObject({
    type: "object",
    required: ["email", "password"],
    properties: { email: { type: "string", format: "email" }, password: { minLength: 12, maxLength: 128 } },
    additionalProperties: false,
  });
});

it("is readable as a page that needs no script and nothing from elsewhere", async () => {
  const { paths, components } = await document();
  const page = (await request(server.app).get("/api/docs").expect(200).expect("Content-Type", /html/)).text;
  for (const path of Object.keys(paths)) expect(page).toContain(`/api${path}</code>`);
  for (const name of Object.keys(components.schemas)) expect(page).toContain(`id="schema-${name}"`);
  expect(page).not.toMatch(/<script|https?:|javascript:| on\w+=/);
  const anchors = [...page.matchAll(/href="#([^"]+)"/g)].map(([, name]) => name);
  for (const anchor of anchors) expect(page).toContain(`id="${anchor}"`);
});
