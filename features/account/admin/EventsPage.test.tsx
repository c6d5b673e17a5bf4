import { screen } from "@testing-library/react";
import { setAccountStage, show } from "@/__tests__/client/accountStage";
import { EventsPage } from "./EventsPage";
import { HealthPage } from "./HealthPage";

const stage = setAccountStage({ signedIn: true });

it("tells each event in words, with whom and by whom, and never an address of the network", async () => {
  stage.answers["GET /admin/audit"] = {
    status: 200,
    body: [
      {
        id: "7",
        at: "2026-03-03T14:05:00.000Z",
        what: "role-changed",
        userId: "10000000-0000-4000-8000-000000000001",
        byUserId: "20000000-0000-4000-8000-000000000002",
        addressHash: "abcdef0123456789",
      },
      {
        id: "6",
        at: "2026-03-03T14:00:00.000Z",
        what: "sign-in-refused",
        userId: null,
        byUserId: null,
        addressHash: null,
      },
      {
        id: "5",
        at: "2026-03-03T13:00:00.000Z",
        what: "email-change-asked",
        userId: null,
        byUserId: null,
        addressHash: null,
      },
    ],
  };
  show(<EventsPage />);
  expect(await screen.findByText("Role changed")).toBeTruthy();
  expect(screen.getByText("Sign in refused")).toBeTruthy();
  expect(screen.getByText("E-mail change asked")).toBeTruthy();
  for (const cell of ["10000000", "20000000", "abcdef01"]) expect(screen.getByText(cell)).toBeTruthy();
});

it("says so where nothing happened yet", async () => {
  stage.answers["GET /admin/audit"] = { status: 200, body: [] };
  show(<EventsPage />);
  expect(await screen.findByText("Nothing has happened yet.")).toBeTruthy();
  expect(screen.queryByText("When")).toBeNull();
});

it("tells the health of queue, mail and each storage in words", async () => {
  stage.answers["GET /admin/health"] = {
    status: 200,
    body: {
      queue: { waiting: 3, retrying: 1, failed: 0, oldestDueS: 12.4 },
      mail: { sent: 40, sending: 1, uncertain: 0, refused: 2 },
      storage: [{ name: "recordings", up: false }],
    },
  };
  show(<HealthPage />);
  expect(await screen.findByText(/3 waiting, 1 tried again, 0 given up; the oldest is due for 12 s/)).toBeTruthy();
  expect(screen.getByText(/40 sent, 1 on their way, 0 uncertain, 2 refused/)).toBeTruthy();
  expect(screen.getByText("does not answer")).toBeTruthy();
});
