import { daysUntil, distanceInDays, dueWords } from "./dayWords";
import { inOrderOfWork, partDue } from "./partWords";

const now = new Date(2026, 10, 24, 23, 30);

it("counts days by the calendar, whatever hour it is", () => {
  expect(daysUntil("2026-12-10", now)).toBe(16);
  expect(distanceInDays(daysUntil("2026-11-25", now))).toBe("tomorrow");
  expect(distanceInDays(daysUntil("2026-11-21", now))).toBe("3 days ago");
});

it("says when something is due, and that it is overdue", () => {
  expect(dueWords("2026-11-24", now)).toBe("due today");
  expect(dueWords("2026-12-10", now)).toBe("due Thu 10 Dec");
  expect(dueWords("2026-11-20", now)).toBe("overdue since Fri 20 Nov");
  expect(partDue("accepted", "2026-11-20", now)).toBeNull();
});

it("puts what is to be sung first by its day, what is handed in after it, and what is accepted last", () => {
  const part = (state: "assigned" | "handed-in" | "returned" | "accepted", dueOn: string | null) => ({
    ...{ state, dueOn, assignedAt: "2026-11-17T20:15:00.000Z" },
  });
  const parts = [
    part("accepted", "2026-11-01"),
    part("handed-in", null),
    part("assigned", null),
    part("returned", "2026-12-03"),
  ];
  expect(inOrderOfWork(parts).map(({ state }) => state)).toEqual(["returned", "assigned", "handed-in", "accepted"]);
});
