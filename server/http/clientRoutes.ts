/** The addresses that the web client knows; every other page answers 404. ":id" stands for an id, ":token" for the secret of a link. */
export const clientRoutes = [
  "/",
  "/voice",
  "/voice/sing",
  "/voice/upload",
  "/voice/by-hand",
  "/voice/guided",
  "/songs",
  "/songs/new",
  "/songs/import",
  "/songs/:id",
  "/songs/:id/edit",
  "/songs/:id/history",
  "/songs/:id/keys",
  "/songs/:id/compare",
  "/songs/:id/together",
  "/songs/:id/ways",
  "/songs/:id/arrangements",
  "/songs/:id/arrangements/:arrangement",
  "/songs/:id/why",
  "/songs/:id/everyone",
  "/songs/:id/melody",
  "/songs/:id/recording",
  "/songs/:id/try",
  "/songs/:id/sheet",
  "/songs/:id/stage",
  "/shared/:token",
  "/shared/:token/stage",
  "/instruments",
  "/instruments/tune",
  "/instruments/new",
  "/instruments/retune",
  "/instruments/:id",
  "/known-shapes",
  "/studio",
  "/studio/new",
  "/studio/:id",
  "/studio/:id/invite",
  "/studio/:id/groups",
  "/studio/:id/settings",
  "/studio/:id/key",
  "/studio/:id/assign",
  "/studio/:id/assignments",
  "/studio/:id/assignments/:id",
  "/studio/parts/:id",
  "/invite",
  "/guardian",
  "/account",
  "/account/sign-in",
  "/account/sign-up",
  "/account/forgotten",
  "/account/reset",
  "/account/confirm",
  "/account/unsubscribe",
  "/account/security",
  "/account/sessions",
  "/account/mail",
  "/account/data",
  "/account/sharing",
  "/admin",
  "/admin/health",
  "/admin/audit",
] as const;

const id = "[0-9a-fA-F]{8}(?:-[0-9a-fA-F]{4}){3}-[0-9a-fA-F]{12}";
/** What cannot be a link gets the same page, which then says so. */
const token = "[^/]{1,200}";
/** A kept one by its id, a proposed one by what it is: "closest", "root-2". */
const arrangement = `(?:${id}|[a-z]+(?:-[0-9]{1,2})?)`;
const patterns = clientRoutes.map((route) => {
  const pattern = route.replaceAll(":id", id).replaceAll(":token", token).replaceAll(":arrangement", arrangement);
  return new RegExp(`^${pattern}/?$`);
});

export function isClientRoute(path: string): boolean {
  return patterns.some((pattern) => pattern.test(path));
}
