import { fireEvent, screen, waitFor } from "@testing-library/react";
import { setAccountStage, show } from "@/__tests__/client/accountStage";
import { MailChoices } from "./MailChoices";

const stage = setAccountStage({ signedIn: true });
const start = { assigned: true, handedIn: true, answered: true, weekly: false };

beforeEach(() => {
  stage.answers["GET /mail/preferences"] = { status: 200, body: start };
});

const isOn = (name: RegExp) => screen.getByRole("switch", { name }).getAttribute("aria-checked");

it("switches one kind of mail at once, by pointer and by the space bar, and leaves the others", async () => {
  stage.answers["PUT /mail/preferences"] = { status: 200, body: start };
  show(<MailChoices />);
  const weekly = await screen.findByRole("switch", { name: /Your week/ });
  expect(isOn(/Your week/)).toBe("false");
  fireEvent.click(weekly);
  await waitFor(() => expect(isOn(/Your week/)).toBe("true"));
  fireEvent.keyDown(screen.getByRole("switch", { name: /A song for you/ }), { key: " " });
  await waitFor(() => expect(isOn(/A song for you/)).toBe("false"));
  expect(stage.sent("PUT /mail/preferences")).toEqual([
    { ...start, weekly: true },
    { ...start, weekly: true, assigned: false },
  ]);
});

it("goes back where a choice could not be kept, and says so", async () => {
  show(<MailChoices />);
  const weekly = await screen.findByRole("switch", { name: /Your week/ });
  stage.offline = true;
  fireEvent.click(weekly);
  expect((await screen.findByRole("alert")).textContent).toMatch(/This is not kept/);
  expect(isOn(/Your week/)).toBe("false");
});
