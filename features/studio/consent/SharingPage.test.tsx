import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor } from "@testing-library/react";
import { Answers } from "@/__tests__/client/answers";
import { asPupil, aStudio, noGuardian, studioId } from "@/__tests__/client/studioPeople";
import { queryClient } from "@/features/api/queryClient";
import { ThemeProvider } from "@/features/ui/ThemeProvider";
import { SharingPage } from "./SharingPage";

jest.mock("expo-router", () => ({
  useRouter: () => ({ replace: () => undefined }),
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
}));

const alone = { ...noGuardian, needed: false };
let server: Answers;

beforeEach(() => {
  queryClient.clear();
  Element.prototype.scrollIntoView = () => undefined;
  server = new Answers().to("GET /guardian", alone);
  server.install();
});

const open = () =>
  render(
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <SharingPage now={new Date("2026-11-25T12:00:00.000Z")} />
      </ThemeProvider>
    </QueryClientProvider>,
  );

it("takes an agreement back after it was said that recordings go, and says what holds from then on", async () => {
  server.to("GET /studios", [asPupil()]);
  open();
  const agreed = await screen.findByTestId("consent-switch");
  expect(agreed.getAttribute("aria-checked")).toBe("true");
  const withdrawn = asPupil({ shares: false, withdrawnAt: "2026-11-25T12:00:00.000Z" });
  server.to(`PUT /studios/${studioId}/consent`, withdrawn).to("GET /studios", [withdrawn]);
  fireEvent.click(agreed);
  expect(server.bodiesOf(`PUT /studios/${studioId}/consent`)).toEqual([]);
  expect(screen.getByTestId("remove-asked").textContent).toMatch(/Tuesday evening class .* deleted for good/);
  fireEvent.click(screen.getByTestId("remove-confirmed"));
  await waitFor(() => expect(screen.getByTestId("consent-state").textContent).toMatch(/see only your name/));
  expect(server.bodiesOf(`PUT /studios/${studioId}/consent`)).toEqual([{ agree: false }]);
});

it("says that the year of birth is needed first, and where it is told", async () => {
  server.to("GET /studios", [asPupil({ shares: false, givenAt: null })]);
  server.to(`PUT /studios/${studioId}/consent`, { code: "birth-year-needed", message: "Tell it first." }, 409);
  open();
  fireEvent.click(await screen.findByTestId("consent-switch"));
  expect(await screen.findByText("Tell the year of your birth first")).toBeTruthy();
  expect(screen.getByRole("link", { name: "To your data" }).getAttribute("href")).toBe("/account/data");
});

it("tells those under age how far their guardian is", async () => {
  const asked = { needed: true, email: "parent@orlow.example", askedAt: "2026-11-20T12:00:00.000Z" };
  server.to("GET /studios", [asPupil({ shares: false, waitsForGuardian: true })]);
  server.to("GET /guardian", { ...alone, ...asked });
  open();
  expect((await screen.findByTestId("guardian-state")).textContent).toBe(
    "parent@orlow.example was asked Fri 20 Nov and has not answered yet.",
  );
});

it("keeps to hand what somebody agreed to as a pupil, when they teach there now", async () => {
  const promoted = asPupil();
  server.to("GET /studios", [{ ...promoted, me: { ...promoted.me, role: "co-teacher" } }]);
  open();
  expect((await screen.findByTestId("consent-switch")).getAttribute("aria-checked")).toBe("true");
});

it("shows nothing to take back to those who are a pupil nowhere", async () => {
  const { me, ...rest } = aStudio();
  const never = { ...me.consent, givenAt: null };
  server.to("GET /studios", [{ ...rest, me: { ...me, consent: never } }]);
  open();
  expect(await screen.findByTestId("nothing-shared")).toBeTruthy();
});
