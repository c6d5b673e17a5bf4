import { tokens } from "@/features/ui/theme";
import { paperTones } from "@/shared/sheets/paperTones";

it("paper carries the morning's colours at any hour", () => {
  const { ink, inkSoft, line, plum, lagoon, honey, onPlum } = tokens.morning;
  expect(paperTones).toMatchObject({ ink, soft: inkSoft, line, plum, lagoon, reach: honey, onPlum });
});
