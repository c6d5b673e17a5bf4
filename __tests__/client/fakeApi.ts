import { signInRequest, signUpRequest } from "@/shared/contract/account";
import { arrangement } from "@/shared/contract/arrangement";
import { decision } from "@/shared/contract/decision";
import { ownInstrument } from "@/shared/contract/instrument";
import { playerWishes } from "@/shared/contract/playerWishes";
import { lineUp } from "@/shared/contract/lineUp";
import { pageOfSongs, tagsOfSongs } from "@/features/api/deviceSongs";
import type { SongQuestion } from "@/features/api/songQuestion";
import { song, type Song } from "@/shared/contract/song";
import type { SongVersion } from "@/shared/contract/songVersion";
import { take } from "@/shared/contract/take";
import { songTry } from "@/shared/contract/try";
import { voice } from "@/shared/contract/voice";

interface Person {
  id: string;
  email: string;
  password: string;
}

export interface Answer {
  status: number;
  body?: unknown;
}

interface Row {
  owner: string;
  item: { id: string } & Record<string, unknown>;
}

const schemas = {
  voices: voice,
  takes: take,
  songs: song,
  decisions: decision,
  tries: songTry,
  arrangements: arrangement,
  instruments: ownInstrument,
  wishes: playerWishes,
  "line-ups": lineUp,
};
type Name = keyof typeof schemas;

const problem = (status: number, code: string, message: string, fields?: unknown): Answer => ({
  status,
  body: fields === undefined ? { code, message } : { code, message, fields },
});

function reply({ status, body }: Answer) {
  return { ok: status < 400, status, json: async () => JSON.parse(JSON.stringify(body)) as unknown };
}

/** The API's contract, kept in memory, behind `fetch`. */
export class FakeApi {
  readonly calls: string[] = [];
  readonly tables: Record<Name, Map<string, Row>> = {
    voices: new Map(),
    takes: new Map(),
    songs: new Map(),
    decisions: new Map(),
    tries: new Map(),
    arrangements: new Map(),
    instruments: new Map(),
    wishes: new Map(),
    "line-ups": new Map(),
  };
  /** Earlier states of songs, by their id, newest first. Each change keeps the state before: nobody pauses here. */
  readonly versions = new Map<string, SongVersion[]>();
  /** Answers in the server's place, or "down" for a network that fails. */
  intercept: (method: string, path: string) => Answer | "down" | undefined = () => undefined;

  #people: Person[] = [];
  #tokens = new Map<string, string>();
  #cookie: string | null = null;
  #sessions = new Map<string, string>();
  #serial = 0;

  install(): void {
    globalThis.fetch = ((url: string, init: RequestInit) => this.#fetch(url, init)) as unknown as typeof fetch;
  }

  addPerson(email: string, password: string): string {
    const id = `00000000-0000-4000-8000-${String(this.#people.length + 1).padStart(12, "0")}`;
    this.#people.push({ id, email, password });
    return id;
  }

  /** A refresh cookie from an earlier visit. */
  rememberVisit(personId: string): void {
    this.#open(personId);
  }

  expireAccessTokens(): void {
    this.#tokens.clear();
  }

  endSessions(): void {
    this.#tokens.clear();
    this.#sessions.clear();
  }

  count(call: string): number {
    return this.calls.filter((each) => each === call).length;
  }

  /** What a way in of its own answers once it lets a person in. */
  sessionOf(personId: string): Answer {
    this.#open(personId);
    return this.#session(200, personId);
  }

  #open(personId: string): void {
    this.#cookie = `refresh-${++this.#serial}`;
    this.#sessions.set(this.#cookie, personId);
  }

  #session(status: number, personId: string): Answer {
    const accessToken = `access-${++this.#serial}`;
    this.#tokens.set(accessToken, personId);
    const person = this.#people.find((each) => each.id === personId);
    return {
      status,
      body: {
        accessToken,
        expiresInS: 600,
        account: { id: personId, email: person?.email, role: "singer", confirmed: true, secondFactor: false },
      },
    };
  }

  async #fetch(url: string, init: RequestInit) {
    const method = init.method ?? "GET";
    const path = url.replace(/^\/api/, "");
    this.calls.push(`${method} ${path}`);
    // Lets other callers in between, as a network does.
    await new Promise((resolve) => setTimeout(resolve, 0));
    const instead = this.intercept(method, path);
    if (instead === "down") throw new TypeError("Failed to fetch");
    if (instead) return reply(instead);
    const body: unknown = typeof init.body === "string" ? JSON.parse(init.body) : undefined;
    return reply(path.startsWith("/auth/") ? this.#auth(path, body) : this.#collection(method, path, init, body));
  }

  #auth(path: string, body: unknown): Answer {
    if (path === "/auth/sign-out") {
      if (this.#cookie) this.#sessions.delete(this.#cookie);
      this.#cookie = null;
      return { status: 204 };
    }
    if (path === "/auth/refresh") {
      const personId = this.#cookie === null ? undefined : this.#sessions.get(this.#cookie);
      if (personId === undefined || this.#cookie === null) return problem(401, "no-session", "Sign in again.");
      this.#sessions.delete(this.#cookie);
      this.#open(personId);
      return this.#session(200, personId);
    }
    const parsed = (path === "/auth/sign-up" ? signUpRequest : signInRequest).safeParse(body);
    if (!parsed.success)
      return problem(
        422,
        "invalid",
        "Something is missing.",
        parsed.error.issues.map((issue) => ({ path: issue.path.join("."), message: issue.message })),
      );
    const { email, password } = parsed.data;
    const known = this.#people.find((each) => each.email === email);
    if (path === "/auth/sign-up") {
      // The right password of an account opens it; any other makes one apart, so that nobody learns which addresses are known.
      const id = known?.password === password ? known.id : this.addPerson(email, password);
      this.#open(id);
      return this.#session(201, id);
    }
    if (known?.password !== password)
      return problem(401, "wrong-credentials", "E-mail address and password do not belong together.");
    this.#open(known.id);
    return this.#session(200, known.id);
  }

  #collection(method: string, path: string, init: RequestInit, body: unknown): Answer {
    const token = (init.headers as Record<string, string>)["Authorization"]?.replace("Bearer ", "");
    const owner = token === undefined ? undefined : this.#tokens.get(token);
    if (owner === undefined) return problem(401, "not-signed-in", "Sign in first.");
    const [address = "", query = ""] = path.split("?");
    const [, name, id, part, partId] = address.split("/") as [string, Name, ...(string | undefined)[]];
    const table = this.tables[name];
    if (name === "songs" && (id === "page" || id === "tags")) return this.#list(owner, id, new URLSearchParams(query));
    if (id === undefined)
      return { status: 200, body: [...table.values()].filter((row) => row.owner === owner).map((row) => row.item) };
    const row = table.get(id);
    if (row ? row.owner !== owner : method === "GET") return problem(404, "not-found", "This is not on your shelf.");
    if (part === "versions") return this.#versions(id, partId);
    if (method === "GET") return { status: 200, body: row?.item };
    if (method === "DELETE") {
      table.delete(id);
      this.versions.delete(id);
      return { status: 204 };
    }
    const parsed = schemas[name].safeParse(body);
    if (!parsed.success)
      return problem(
        422,
        "invalid",
        "Something is missing.",
        parsed.error.issues.map((issue) => ({ path: issue.path.join("."), message: issue.message })),
      );
    const item = parsed.data as Row["item"];
    const missing = (target: Name, key: string) =>
      typeof item[key] === "string" && this.tables[target].get(item[key])?.owner !== owner;
    if (missing("voices", "voiceId") || missing("songs", "songId"))
      return problem(422, "unknown-reference", "This belongs to something you do not have.");
    if (name === "songs") return this.#putSong(owner, item as unknown as Song, row);
    table.set(id, { owner, item });
    return { status: row ? 200 : 201, body: item };
  }

  #putSong(owner: string, sent: Song, row: Row | undefined): Answer {
    const before = row?.item as unknown as Song | undefined;
    const alike = (a: Song, b: Song) => JSON.stringify({ ...a, revision: 0 }) === JSON.stringify({ ...b, revision: 0 });
    if (before && alike(song.parse(before), sent)) return { status: 200, body: before };
    if (before && before.revision !== sent.revision)
      return problem(409, "changed-elsewhere", "This song was changed in another place meanwhile.");
    if (before) {
      const by = this.#people.find(({ id }) => id === owner)?.email ?? "";
      const version = { id: `20000000-0000-4000-8000-${String(++this.#serial).padStart(12, "0")}`, by, song: before };
      const savedAt = new Date().toISOString();
      this.versions.set(sent.id, [{ ...version, savedAt }, ...(this.versions.get(sent.id) ?? [])]);
    }
    const item = { ...sent, revision: before ? before.revision + 1 : 1 };
    this.tables.songs.set(sent.id, { owner, item });
    return { status: before ? 200 : 201, body: item };
  }

  #versions(songId: string, versionId: string | undefined): Answer {
    const versions = this.versions.get(songId) ?? [];
    if (versionId === undefined)
      return { status: 200, body: versions.map(({ song: then, ...entry }) => ({ ...entry, title: then.title })) };
    const version = versions.find(({ id }) => id === versionId);
    return version ? { status: 200, body: version } : problem(404, "not-found", "There is no such version.");
  }

  #list(owner: string, what: "page" | "tags", query: URLSearchParams): Answer {
    const songs = [...this.tables.songs.values()]
      .filter((row) => row.owner === owner)
      .map((row) => row.item as unknown as Song);
    if (what === "tags") return { status: 200, body: tagsOfSongs(songs) };
    const archived = query.get("archived") ?? "false";
    const question: SongQuestion = {
      q: query.get("q") ?? "",
      tag: query.get("tag"),
      archived: archived === "all" ? "all" : archived === "true",
      sort: (query.get("sort") ?? "title") as NonNullable<SongQuestion["sort"]>,
      limit: Number(query.get("limit") ?? 50),
      cursor: query.get("cursor"),
    };
    return { status: 200, body: pageOfSongs(songs, question) };
  }
}
