import request from "supertest";
import { type Permission, permissions } from "../../server/auth/permissions";
import type { DescribedOperation } from "../../server/http/openApi";
import { type Fixture, type FixtureMaker, fixtures } from "./permissionFixtures";
import { Person, startTestServer, type TestServer } from "./testServer";

interface Route {
  id: string;
  method: "get" | "post" | "put" | "delete" | "head" | "patch";
  path: string;
  guarded: boolean;
  permission: Permission;
}

const kinds = ["visitor", "singer", "teacher", "admin", "admin without codes", "unconfirmed", "suspended"] as const;
type Kind = (typeof kinds)[number];

let server: TestServer;
let routes: Route[];
beforeAll(async () => {
  server = await startTestServer();
  const { body } = await request(server.app).get("/api/openapi.json").expect(200);
  const paths = (body as { paths: Record<string, Record<string, DescribedOperation>> }).paths;
  routes = Object.entries(paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, { operationId: id, security }]) => ({
      id,
      method: method as Route["method"],
      path,
      guarded: security.length > 0,
      permission: permissions[id] as Permission,
    })),
  );
});
afterAll(() => server.close());
beforeEach(() => server.database.query("DELETE FROM tries"));

/** Somebody of this kind; a visitor is nobody. */
async function somebody(kind: Kind): Promise<Person | null> {
  if (kind === "visitor") return null;
  const role = kind.startsWith("admin") ? "admin" : kind === "teacher" ? "teacher" : "singer";
  const person = await Person.put(server, role, kind !== "unconfirmed");
  if (kind === "admin") {
    await server.database.query(
      "INSERT INTO second_factors (user_id, secret, confirmed_at) VALUES ($1, 'unused', now())",
      [person.id],
    );
  }
  return person;
}

const suspend = (person: Person, suspended = true) =>
  server.database.query("UPDATE users SET suspended_at = CASE WHEN $2 THEN now() END WHERE id = $1", [
    person.id,
    suspended,
  ]);

/** What is made once and used again, until a request that was let through may have changed it. */
class Kept<Made> {
  private readonly made = new Map<string, Promise<Made>>();

  get(name: string, make: () => Promise<Made>): Promise<Made> {
    const made = this.made.get(name) ?? make();
    this.made.set(name, made);
    return made;
  }

  forget(): void {
    this.made.clear();
  }
}

/** The status of refusal that the table demands; null where the person is let through. */
function refusal(kind: Kind, { who, confirmed }: Permission): number | null {
  if (who === "visitor") return null;
  if (kind === "visitor") return 401;
  if (kind === "suspended") return 403;
  if (who !== "person") {
    const role = kind === "teacher" || kind === "admin" ? kind : kind.startsWith("admin") ? "admin" : "singer";
    if (!who.includes(role) || kind === "admin without codes") return 403;
  }
  return confirmed && kind === "unconfirmed" ? 403 : null;
}

const fill = (path: string, ids: Record<string, string>) =>
  `/api${path.replace(/\{(\w+)\}/g, (_, name: string) => ids[name] ?? "missing")}`;

async function ask(person: Person | null, { method, path }: Route, { ids, body, headers = {} }: Fixture) {
  const asking = request(server.app)[method](fill(path, ids)).set(headers);
  if (person) asking.set("Authorization", `Bearer ${person.token}`);
  return method === "get" || method === "head" ? asking : asking.send(body ?? {});
}

/** What can be made for the ids of a path, and under which name. */
const makerOf = (path: string): [prefix: string, maker: FixtureMaker] => {
  const [prefix] = Object.keys(fixtures)
    .filter((beginning) => path.startsWith(beginning))
    .sort((a, b) => b.length - a.length);
  if (prefix === undefined)
    throw new Error(`No fixture says what the ids of ${path} can name (permissionFixtures.ts).`);
  return [prefix, fixtures[prefix]!];
};

it("every route is classified, and no entry stands for a route that is gone", () => {
  expect(routes.length).toBeGreaterThan(60);
  expect(routes.map(({ id }) => id).sort()).toEqual(Object.keys(permissions).sort());
  for (const { id, path, guarded, permission } of routes) {
    expect([id, permission.who !== "visitor"]).toEqual([id, guarded]);
    expect([id, permission.object !== "none"]).toEqual([id, path.includes("{")]);
  }
});

/** A refusal changes nothing, and neither does asking. */
const mayChange = ({ method, permission }: Route, kind: Kind) =>
  method !== "get" && method !== "head" && refusal(kind, permission) === null && permission.who !== "visitor";

describe.each(kinds)("for somebody who is %s", (kind) => {
  it("every route without an id answers as the table says", async () => {
    const people = new Kept<Person | null>();
    for (const route of routes.filter(({ permission }) => permission.object === "none")) {
      const person = await people.get(kind, async () => {
        const made = await somebody(kind);
        if (made && kind === "suspended") await suspend(made);
        return made;
      });
      const { status, body } = await ask(person, route, { ids: {} });
      const expected = refusal(kind, route.permission);
      if (expected !== null) expect([route.id, status]).toEqual([route.id, expected]);
      else {
        // Let through, it may find fault with what was sent, but never with who sends it.
        expect([route.id, status < 500, ["not-allowed", "suspended", "unconfirmed"].includes(body.code)]).toEqual([
          route.id,
          true,
          false,
        ]);
        if (person && route.permission.who !== "visitor") expect([route.id, status]).not.toEqual([route.id, 401]);
      }
      if (mayChange(route, kind)) people.forget();
    }
  }, 120_000);

  it("every route with an id answers as the table says of one's own, another's and nobody's thing", async () => {
    const people = new Kept<Person | null>();
    const things = new Kept<{ own: Fixture; foreign: Fixture; absent: Fixture }>();
    for (const route of routes.filter(({ permission }) => permission.object !== "none")) {
      const owner = (await people.get("owner", () => somebody("singer")))!;
      const person = await people.get(kind, () => somebody(kind));
      const [prefix, maker] = makerOf(route.path);
      const asked = await things.get(prefix, async () => {
        // Whoever is suspended has what they made before.
        if (person && kind === "suspended") await suspend(person, false);
        const made = {
          own: await maker.make(person ?? owner, server),
          foreign: await maker.make(owner, server),
          absent: await maker.absent(person ?? owner, server),
        };
        if (person && kind === "suspended") await suspend(person);
        return made;
      });
      // One's own last: it may be gone, or the session with it.
      for (const which of ["foreign", "absent", "own"] as const) {
        const { status } = await ask(person, route, asked[which]);
        const what = [route.id, which];
        const expected = refusal(kind, route.permission);
        const { object } = route.permission;
        if (expected !== null) expect([...what, status]).toEqual([...what, expected]);
        else if (which === "absent" && object === "own-or-new") expect([...what, status]).toEqual([...what, 201]);
        else if (which === "absent") expect([...what, status]).toEqual([...what, 404]);
        else if (which === "foreign" && object !== "any" && object !== "link")
          expect([...what, status]).toEqual([...what, 404]);
        // Administrators leave their own account to others.
        else if (which === "own" && object === "any") expect([...what, status]).toEqual([...what, 409]);
        else expect([...what, status < 300]).toEqual([...what, true]);
      }
      if (mayChange(route, kind)) {
        people.forget();
        things.forget();
      }
    }
  }, 120_000);
});
