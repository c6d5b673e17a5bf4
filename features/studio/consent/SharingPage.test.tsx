import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor } from "@testing-library/react";
import { Answers } from "@/__tests__/client/answers";
import { asPupil, aStudio, studioId } from "@/__tests__/client/studioPeople";
import { queryClient } from "@/features/api/queryClient";
import { ThemeProvider } from "@/features/ui/ThemeProvider";
import { SharingPage } from "./SharingPage";

jest.mock("expo-router", () => ({
  useRouter: () => ({ replace: () => undefined }),
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
}));

const alone = {
  needed: false,
  age: 16,
  email: null,
  askedAt: null,
  confirmedAt: null,
  withdrawnAt: null,
  refusedAt: null,
};
let server: Answers;

beforeEach(() => {
  queryClient.clear();
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

it("takes an agreement back with one press, and says what holds from then on", async () => {
  server.to("GET /studios", [asPupil()]);
  open();
  const agreed = await screen.findByTestId("consent-switch");
  expect(agreed.getAttribute("aria-checked")).toBe("true");
  const withdrawn = asPupil({ shares: false, withdrawnAt: "2026-11-25T12:00:00.000Z" });
  server.to(`PUT /studios/${studioId}/consent`, withdrawn).to("GET /studios", [withdrawn]);
  fireEvent.click(agreed);
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

it("shows nothing to take back to those who are a pupil nowhere", async () => {
  server.to("GET /studios", [aStudio()]);
  open();
  expect(await screen.findByTestId("nothing-shared")).toBeTruthy();
});
