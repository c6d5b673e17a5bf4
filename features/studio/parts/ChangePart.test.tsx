import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor } from "@testing-library/react";
import { Answers } from "@/__tests__/client/answers";
import { aPart, aPupil, studioId } from "@/__tests__/client/studioPeople";
import { queryClient } from "@/features/api/queryClient";
import { ThemeProvider } from "@/features/ui/ThemeProvider";
import { presets } from "@/shared/instruments/presets";
import type { Way } from "@/shared/ways/way";
import { ChangePart } from "./ChangePart";

const way = (capo: number, shapeKey: string) =>
  ({ retune: 0, capo, shapeKey, title: `Capo ${capo}, play shapes in ${shapeKey}` }) as unknown as Way;
const ways = [way(0, "D"), way(2, "C")];
const part = aPart();
const piece = {
  song: { id: part.id, title: part.title, tune: null },
  ...{ written: { tonic: "C", mode: "major" as const }, chords: ["C", "G"], sequence: ["C", "G", "C"] },
};

it("begins with what the pupil has, and gives what the teacher changed", async () => {
  queryClient.clear();
  const pupil = aPupil(1, part.pupil, 53, { instrument: { presetId: "box-adf" } as never });
  const server = new Answers().to(`GET /studios/${studioId}/roster`, [pupil]).to(`PUT /parts/${part.id}`, part);
  server.install();
  render(
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <ChangePart
          part={part}
          piece={piece}
          useWays={(wanted) => wanted.map(({ playing }) => (playing ? ways : null))}
          instrumentOf={() => presets[0]!}
        />
      </ThemeProvider>
    </QueryClientProvider>,
  );
  fireEvent.click(screen.getByTestId("change-part"));
  const key = await screen.findByTestId<HTMLSelectElement>(`key-${part.memberId}`);
  expect(key.value).toBe("2");
  expect(screen.getByTestId<HTMLSelectElement>(`way-${part.memberId}`).value).toBe("0 2 C");
  fireEvent.change(key, { target: { value: "-3" } });
  fireEvent.change(screen.getByTestId("change-note"), { target: { value: "Lower today." } });
  fireEvent.click(screen.getByTestId("keep-part"));
  await waitFor(() => expect(screen.queryByTestId("keep-part")).toBeNull());
  const { id, name } = presets[0]!;
  expect(server.bodiesOf(`PUT /parts/${part.id}`)).toEqual([
    {
      ...{ tonic: "A", shift: -3, instrument: { id, name }, way: { retune: 0, capo: 0, shapeKey: "D" } },
      partNote: "Lower today.",
    },
  ]);
});
