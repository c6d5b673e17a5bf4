import { QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen } from "@testing-library/react";
import { Answers } from "@/__tests__/client/answers";
import { asPupil, noGuardian } from "@/__tests__/client/studioPeople";
import { queryClient } from "@/features/api/queryClient";
import { session } from "@/features/api/session";
import { SessionProvider } from "@/features/api/SessionProvider";
import { ThemeProvider } from "@/features/ui/ThemeProvider";
import { InvitePage } from "./InvitePage";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  useRouter: () => ({ setParams: () => undefined }),
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
}));

const look = {
  ...{ studio: "Tuesday evening class", teacher: "Rhona Teale", teachers: ["Rhona Teale"], role: "pupil" },
  ...{ email: "maren@orlow.example", sees: ["Your name in this studio.", "The takes you hand in."] },
  ...{ recordingsKeptDays: 90, expiresAt: "2026-12-08T18:00:00.000Z" },
};
let server: Answers;

beforeEach(() => {
  Element.prototype.scrollIntoView = () => undefined;
  sessionStorage.clear();
  localStorage.clear();
  window.history.replaceState(null, "", "/invite#a-token");
  server = new Answers().to("POST /invites/look", look).to("GET /account/person", { birthYear: null, country: null });
  server.to("PUT /account/person", { birthYear: 1988, country: null });
  server.install();
});

afterEach(async () => {
  await act(() => session.signOut());
  queryClient.clear();
  window.history.replaceState(null, "", "/");
});

async function open(signedIn = true) {
  await session.settled();
  if (signedIn) await session.signIn({ email: "maren@orlow.example", password: "tide tables 1907" });
  render(
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <SessionProvider>
          <InvitePage countries={[{ value: "", label: "Not told" }]} />
        </SessionProvider>
      </ThemeProvider>
    </QueryClientProvider>,
  );
}

const type = (testId: string, value: string) => fireEvent.change(screen.getByTestId(testId), { target: { value } });

it("tells a stranger who invites and what a teacher would see, and keeps the link over signing in", async () => {
  await open(false);
  expect((await screen.findByTestId("who-invites")).textContent).toMatch(/Rhona Teale invites you as a pupil/);
  expect(screen.getByTestId("what-is-seen").textContent).toContain("The takes you hand in.");
  expect(screen.getByRole("link", { name: "Make an account" }).getAttribute("href")).toBe(
    "/account/sign-up?next=%2Finvite",
  );
  expect(sessionStorage.getItem("larkspan.invite-link")).toBe("a-token");
  expect(server.bodiesOf("POST /invites/look")).toEqual([{ token: "a-token" }]);
});

it("joins nobody who has chosen neither to agree nor not to", async () => {
  await open();
  await screen.findByTestId("join-name");
  type("join-name", "Maren Oake");
  fireEvent.click(screen.getByTestId("join"));
  expect(await screen.findByTestId("wish-missing")).toBeTruthy();
  expect(server.bodiesOf("POST /invites/accept")).toEqual([]);
});

it("asks for the year of birth where one agrees, then joins with what was chosen", async () => {
  server.to("POST /invites/accept", asPupil());
  await open();
  await screen.findByTestId("join-name");
  type("join-name", " Maren Oake ");
  fireEvent.click(screen.getByRole("radio", { name: /^I agree/ }));
  fireEvent.click(screen.getByTestId("join"));
  expect(await screen.findByText(/Give the year; the rules differ/)).toBeTruthy();
  type("join-year", "1988");
  fireEvent.click(screen.getByTestId("join"));
  expect(await screen.findByTestId("joined")).toBeTruthy();
  expect(server.bodiesOf("PUT /account/person")).toEqual([{ birthYear: 1988, country: null }]);
  expect(server.bodiesOf("POST /invites/accept")).toEqual([{ token: "a-token", name: "Maren Oake", agree: true }]);
  expect(sessionStorage.getItem("larkspan.invite-link")).toBeNull();
  expect(screen.queryByTestId("guardian-email")).toBeNull();
});

it("asks before joining where the year typed would end sharing elsewhere, keeps the old one, or ends it and joins", async () => {
  const why = "By this your teachers see only your name (Tuesday upstairs), and recordings are deleted for good.";
  server.to("GET /account/person", { birthYear: 1988, country: null });
  server.to("PUT /account/person", { code: "ends-sharing", message: why }, 409);
  server.to("POST /invites/accept", asPupil({ shares: false }));
  await open();
  await screen.findByTestId("join-name");
  type("join-name", "Maren Oake");
  type("join-year", "2015");
  fireEvent.click(screen.getByRole("radio", { name: /^Join without/ }));
  fireEvent.click(screen.getByTestId("join"));
  expect((await screen.findByRole("group", { name: "Stop sharing?" })).textContent).toContain(why);
  expect(server.bodiesOf("POST /invites/accept")).toEqual([]);
  fireEvent.click(screen.getByRole("button", { name: "Go on sharing" }));
  expect(screen.queryByRole("group", { name: "Stop sharing?" })).toBeNull();
  expect(screen.getByTestId<HTMLInputElement>("join-year").value).toBe("1988");
  expect(screen.getByTestId<HTMLInputElement>("join-name").value).toBe("Maren Oake");
  type("join-year", "2015");
  fireEvent.click(screen.getByTestId("join"));
  await screen.findByRole("group", { name: "Stop sharing?" });
  server.to("PUT /account/person", { birthYear: 2015, country: null });
  fireEvent.click(screen.getByRole("button", { name: "Stop and delete them" }));
  expect(await screen.findByTestId("joined")).toBeTruthy();
  expect(server.bodiesOf("PUT /account/person")).toContainEqual({ birthYear: 2015, country: null, endsSharing: true });
  expect(server.bodiesOf("POST /invites/accept")).toEqual([{ token: "a-token", name: "Maren Oake", agree: false }]);
});

it("asks those who are too young for a guardian's address, and says that nothing is shared until then", async () => {
  server.to("POST /invites/accept", asPupil({ shares: false, waitsForGuardian: true })).to("POST /guardian", {}, 202);
  server.to("GET /guardian", noGuardian);
  await open();
  await screen.findByTestId("join-name");
  type("join-name", "Cass Wether");
  type("join-year", "2013");
  fireEvent.click(screen.getByRole("radio", { name: /^I agree/ }));
  fireEvent.click(screen.getByTestId("join"));
  await screen.findByTestId("guardian-email");
  expect(screen.getByTestId("joined").textContent).toMatch(/has not confirmed yet/);
  type("guardian-email", "parent@orlow.example");
  fireEvent.click(screen.getByTestId("ask-guardian"));
  expect(await screen.findByTestId("guardian-asked")).toBeTruthy();
  expect(server.bodiesOf("POST /guardian")).toEqual([{ email: "parent@orlow.example" }]);
});

it("asks for no address where a guardian is known and has the mail already, and says once where another one goes", async () => {
  server.to("POST /invites/accept", asPupil({ shares: false, waitsForGuardian: true }));
  server.to("GET /guardian", { ...noGuardian, email: "parent@orlow.example", askedAt: "2026-12-01T18:00:00.000Z" });
  await open();
  await screen.findByTestId("join-name");
  type("join-name", "Cass Wether");
  type("join-year", "2013");
  fireEvent.click(screen.getByRole("radio", { name: /^I agree/ }));
  fireEvent.click(screen.getByTestId("join"));
  expect((await screen.findByTestId("guardian-known")).textContent).toContain("went to parent@orlow.example");
  expect(screen.getByTestId<HTMLInputElement>("guardian-email").value).toBe("parent@orlow.example");
  expect(screen.getByTestId("ask-guardian").textContent).toBe("Ask once more");
  server.to("POST /guardian", {}, 202);
  fireEvent.click(screen.getByTestId("ask-guardian"));
  expect((await screen.findByTestId("guardian-asked")).textContent).toContain("parent@orlow.example");
  expect(screen.queryByTestId("guardian-known")).toBeNull();
});

it("says of a link that is over what to do", async () => {
  server.to("POST /invites/look", { code: "link-not-valid", message: "Over." }, 410);
  await open();
  expect(await screen.findByTestId("link-not-valid")).toBeTruthy();
});
