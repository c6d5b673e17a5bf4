import type { Api } from "../http/api";
import { assignmentsRoutes } from "./assignments/assignments.router";
import { partsRoutes } from "./assignments/parts.router";
import { consentRoutes } from "./consent/consent.router";
import { groupsRoutes } from "./groups/groups.router";
import { invitesRoutes } from "./invites/invites.router";
import { rosterRoutes } from "./roster/roster.router";
import type { StudioParts } from "./studioParts";
import { studiosRoutes } from "./studios.router";

/** Teachers and their pupils. */
export function studioRoutes(api: Api, parts: StudioParts): void {
  studiosRoutes(api, parts);
  rosterRoutes(api, parts);
  groupsRoutes(api, parts);
  invitesRoutes(api, parts);
  consentRoutes(api, parts);
  assignmentsRoutes(api, parts);
  partsRoutes(api, parts);
}
