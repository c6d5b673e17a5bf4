import { render, screen } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import type { Layout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import { SongScreen } from "./SongScreen";

let mockLayout: Layout = "phone";
jest.mock("@/features/ui/useLayout", () => ({ useLayout: () => mockLayout }));
jest.mock("expo-router", () => ({
  Link: ({ children, testID }: { children: React.ReactNode; testID?: string }) => (
    <a href="#x" data-testid={testID}>
      {children}
    </a>
  ),
}));

function open(layout: Layout, song: Song) {
  mockLayout = layout;
  return render(
    <SongScreen
      song={song}
      target={{ key: { tonic: "C", mode: "major" }, shift: -14, decided: true }}
      card={null}
      decided={null}
      keys={null}
      ways={null}
      use={null}
      onRemove={() => undefined}
      removal={{ isPending: false, error: null }}
    />,
  );
}

test.each(["phone", "wide"] as const)("words without chords are not moved and not played (%s)", (layout) => {
  open(layout, aSong({ chart: "Low tide and still\nthe gulls go by" }));
  expect(screen.getByTestId("chart").textContent).toContain("tide");
  expect(screen.queryByTestId("to-ways")).toBeNull();
  expect(screen.queryByTestId("toggle-key")).toBeNull();
  expect(document.body.textContent).not.toContain("moved");
});

test("a song with chords has its ways and its other key", () => {
  open("phone", aSong());
  expect(screen.getByTestId("to-ways").textContent).toBe("Ways to play it in C");
  expect(screen.getByTestId("toggle-key")).toBeTruthy();
});
