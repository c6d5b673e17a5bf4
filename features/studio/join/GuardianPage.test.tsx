import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen } from "@testing-library/react";
import { Answers } from "@/__tests__/client/answers";
import { queryClient } from "@/features/api/queryClient";
import { ThemeProvider } from "@/features/ui/ThemeProvider";
import type { GuardianLook } from "@/shared/contract/studio/consent";
import { GuardianPage } from "./GuardianPage";

jest.mock("@/features/api/useMailedToken", () => ({ useMailedToken: () => "a-token" }));

const studio = { teachers: ["Rhona Teale"], recordingsKeptDays: 90 };
const first = { ...studio, name: "Tuesday evening class", confirmed: true };
const second = { ...studio, name: "Saturday class", confirmed: false };
let server: Answers;

beforeEach(() => {
  queryClient.clear();
  server = new Answers();
  server.install();
});

function open(change: Pick<GuardianLook, "link" | "studios">) {
  const confirmed = change.studios.every((each) => each.confirmed);
  server.to("POST /guardian/look", { pupil: "Cass Wether", sees: ["The name."], confirmed, ...change });
  for (const word of ["confirm", "withdraw"]) server.to(`POST /guardian/${word}`, undefined, 204);
  render(
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <GuardianPage />
      </ThemeProvider>
    </QueryClientProvider>,
  );
}
const press = async (testId: string) => fireEvent.click(await screen.findByTestId(testId));
const done = async () => (await screen.findByTestId("guardian-done")).textContent;

it("a no to a second studio says that what was agreed to before stays", async () => {
  open({ link: "ask", studios: [first, second] });
  expect((await screen.findByTestId("guardian-withdraw")).textContent).toBe("I do not agree");
  expect(screen.getByTestId("guardian-reach").textContent).toMatch(/use the link in the mail that came after/);
  await press("guardian-withdraw");
  expect(await done()).toMatch(/In Saturday class the teachers see nothing.*stays as it is: Tuesday evening class/);
  expect(await done()).not.toMatch(/deleted/);
});

it("takes back by the kept link, for every studio, and says before that recordings go", async () => {
  open({ link: "keep", studios: [first, second] });
  expect((await screen.findByTestId("guardian-withdraw")).textContent).toBe("Take my word back");
  expect(screen.getByTestId("guardian-reach").textContent).toMatch(/every studio.*recordings.*deleted/);
  await press("guardian-withdraw");
  expect(await done()).toMatch(/Nothing is shared.*deleted/);
});

it.each([
  ["ask", /A mail brings you a link/],
  ["keep", /The link that brought you here stays good/],
] as const)("promises a mail after a yes only where one comes (%s)", async (link, words) => {
  open({ link, studios: [second] });
  await press("guardian-confirm");
  expect(await done()).toMatch(words);
});

it("has nothing to press where the asking link is over and everything agreed to", async () => {
  open({ link: "ask", studios: [first] });
  await screen.findByTestId("guardian-reach");
  expect(screen.queryByRole("button")).toBeNull();
});
