/** What a server answers to "GET /studios/…"; a function sees what was sent. */
type Answer = unknown;

/** A server that gives the answers it was told, lets everybody in, and remembers what was asked. */
export class Answers {
  /** "POST /parts/x/comments" with what was sent, in order */
  readonly sent: { call: string; body: unknown }[] = [];
  #answers = new Map<string, { status: number; body: Answer }>();

  install(): void {
    globalThis.fetch = (async (url: string, init: RequestInit = {}) => {
      const call = `${init.method ?? "GET"} ${url.replace(/^\/api/, "")}`;
      await new Promise((resolve) => setTimeout(resolve, 0));
      if (call === "POST /auth/refresh" || call === "POST /auth/sign-in") return this.#session();
      if (call === "POST /auth/sign-out") return reply(204, null);
      const body: unknown = typeof init.body === "string" ? JSON.parse(init.body) : undefined;
      this.sent.push({ call, body });
      const found = this.#answers.get(call);
      return found ? reply(found.status, found.body) : reply(404, { code: "not-found", message: `No answer: ${call}` });
    }) as unknown as typeof fetch;
  }

  /** From now on this is the answer. */
  to(call: string, body: Answer, status = 200): this {
    this.#answers.set(call, { status, body });
    return this;
  }

  bodiesOf(call: string): unknown[] {
    return this.sent.filter((each) => each.call === call).map(({ body }) => body);
  }

  #session() {
    const account = {
      ...{ id: "00000000-0000-4000-8000-0000000000aa", email: "maren@orlow.example", role: "singer" },
      ...{ confirmed: true, secondFactor: false },
    };
    return reply(200, { accessToken: "access", expiresInS: 600, account });
  }
}

function reply(status: number, body: unknown) {
  return {
    ok: status < 400,
    status,
    json: async () => JSON.parse(JSON.stringify(body ?? null)) as unknown,
    blob: async () => new Blob([String(body)]),
  };
}
