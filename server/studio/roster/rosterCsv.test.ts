import { csvField, rosterCsv } from "./rosterCsv";

it.each(["=1+1", "+1", "-1", "@SUM(A1)", "\t=1", "\r=1", "\n=1", "  =1", "|calc", "＝1"])(
  "takes the power from %j, which a spreadsheet would run",
  (text) => {
    expect(csvField(text)).toBe(`"'${text}"`);
  },
);

it.each([
  ["Lowri Tate", '"Lowri Tate"'],
  ['the "old" one, kept', '"the ""old"" one, kept"'],
  ["two\nlines", '"two\nlines"'],
  ["", '""'],
])("quotes %j", (text, field) => {
  expect(csvField(text)).toBe(field);
});

it("begins with the mark of UTF-8, names its columns and ends each line as RFC 4180 says", () => {
  const consent = { givenAt: null, withdrawnAt: null, waitsForGuardian: false, shares: false };
  const row = {
    ...{ memberId: "m", name: "=Joss", role: "pupil" as const, groupIds: ["g", "gone"], consent },
    ...{ joinedAt: "2026-11-24T19:20:00.000Z", voice: null, instrument: null, wishes: null },
    ...{ open: [], openCount: 0, lastTake: null, waiting: 0, warnings: [] },
  };
  const csv = rosterCsv([row], new Map([["g", "Tuesday, late"]]));
  const [head, line, end] = csv.split("\r\n");
  expect(head).toMatch(/^\uFEFF"Name","Role",/);
  expect(line).toMatch(/^"'=Joss","pupil","Tuesday, late","2026-11-24","no",""/);
  expect(line?.split(",")).toHaveLength((head?.split(",").length ?? 0) + 1);
  expect(end).toBe("");
});
