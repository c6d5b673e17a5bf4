import { HttpProblem } from "../http/httpProblem";
import { idIn } from "../http/ownedCollection.router";

/** What all routes for people in studios have in common. */
export const forMembers = { tag: "studio", signedIn: true } as const;

/** Answers that many routes of a studio give, as the API's description words them. */
export const missingStudio = { description: "There is no such studio, or one is not in it." };
export const teachersOnly = { description: "Only for teachers of the studio (teachers-only)." };
export const ownerOnly = { description: "Only for the owner of the studio (owner-only)." };
export const linkOver = { description: "The link is used up, too old, or taken back (link-not-valid)." };

/** Of ids that whoever sends makes. */
export const idTaken = () => new HttpProblem(409, "conflict", "Something else was sent by this id before.");

export const studioIdIn = (params: Record<string, string>) => idIn(params, "id", "studio");
