import { QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen } from "@testing-library/react";
import type { ReactNode } from "react";
import { queryClient } from "@/features/api/queryClient";
import { session } from "@/features/api/session";
import { type Answer, FakeApi } from "./fakeApi";

const email = "maren@orlow.example";
const password = "tide tables 1907";

/** What the tests of an account's screens play on. */
export interface AccountStage {
  /** what the server answers, by method and path, such as "GET /account/sessions" */
  answers: Record<string, Answer>;
  /** nothing can be reached */
  offline: boolean;
  /** what was sent with each request of this method and path, in their order */
  sent: (call: string) => unknown[];
}

/** Sets the stage for one test file by Jest's hooks: a server that says what it is told to, and Maren signed in, or nobody. */
export function setAccountStage({ signedIn }: { signedIn: boolean }): AccountStage {
  let bodies: [call: string, body: unknown][] = [];
  const stage: AccountStage = {
    answers: {},
    offline: false,
    sent: (call) => bodies.filter(([each]) => each === call).map(([, body]) => body),
  };
  let api: FakeApi;
  beforeEach(async () => {
    localStorage.clear();
    sessionStorage.clear();
    stage.answers = {};
    stage.offline = false;
    api = new FakeApi();
    api.intercept = (method, path) => (stage.offline ? "down" : stage.answers[`${method} ${path}`]);
    api.install();
    const send = globalThis.fetch;
    globalThis.fetch = (async (url: string, init: RequestInit) => {
      const body: unknown = typeof init.body === "string" ? JSON.parse(init.body) : undefined;
      bodies.push([`${init.method} ${url.replace(/^\/api/, "")}`, body]);
      return send(url, init);
    }) as typeof fetch;
    api.addPerson(email, password);
    if (signedIn) await act(() => session.signIn({ email, password }));
    else await session.settled();
    bodies = [];
  });
  afterEach(async () => {
    stage.offline = false;
    stage.answers = {};
    await act(() => session.signOut());
    act(() => queryClient.clear());
    standAtHash("");
  });
  return stage;
}

/** What stands behind the # of the address, as if the page had been opened with it. */
export const standAtHash = (hash: string) => window.history.replaceState(null, "", `#${hash}`);

export const show = (screenful: ReactNode) =>
  render(<QueryClientProvider client={queryClient}>{screenful}</QueryClientProvider>);

export const field = (label: string) => screen.getByLabelText<HTMLInputElement>(label, { selector: "input" });

export const type = (label: string, text: string) => fireEvent.change(field(label), { target: { value: text } });

export const valueOf = (label: string) => field(label).value;

export const submit = (name: string) => fireEvent.submit(screen.getByRole("form", { name }));

/** A refusal as the server words it; with `path` at its field. */
export const refusal = (status: number, code: string, message: string, path?: string): Answer => ({
  status,
  body: { code, message, ...(path === undefined ? {} : { fields: [{ path, message }] }) },
});
