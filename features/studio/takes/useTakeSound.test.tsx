import { act, renderHook, waitFor } from "@testing-library/react";
import { Answers } from "@/__tests__/client/answers";
import { useTakeSound } from "./useTakeSound";

/** As much of the browser's player as is used; it goes nowhere by itself. */
class Player extends EventTarget {
  src = "";
  preload = "";
  currentTime = 0;
  paused = true;
  readyState = 0;
  /** what each try to play comes to */
  static fails = false;
  static made: Player;
  constructor() {
    super();
    Player.made = this;
  }
  async play(): Promise<void> {
    if (Player.fails) throw new Error("No.");
    this.paused = false;
    this.readyState = 4;
  }
  pause(): void {
    this.paused = true;
  }
  load(): void {}
  removeAttribute(): void {}
  tell(event: string): void {
    act(() => void this.dispatchEvent(new Event(event)));
  }
}

const link = (url: string, endsInMs = 300_000) => ({ url, expiresAt: new Date(Date.now() + endsInMs).toISOString() });
const path = "GET /hand-ins/one/sound";
let server: Answers;

beforeEach(() => {
  Player.fails = false;
  globalThis.Audio = Player as never;
  server = new Answers().to(path, link("https://store.example/first"));
  server.install();
});

async function playing() {
  const { result } = renderHook(() => useTakeSound("one", 60));
  act(() => result.current.play());
  await waitFor(() => expect(result.current.state).toBe("playing"));
  return result;
}

it("goes on from the same place by a new link when the old one ends while it plays", async () => {
  const result = await playing();
  Player.made.currentTime = 31;
  server.to(path, link("https://store.example/second"));
  Player.made.tell("error");
  await waitFor(() => expect(Player.made.src).toBe("https://store.example/second"));
  await waitFor(() => expect(result.current.state).toBe("playing"));
  expect([Player.made.currentTime, result.current.problem]).toEqual([31, null]);
});

it("says so when it breaks off again at the same place", async () => {
  const result = await playing();
  Player.made.currentTime = 31;
  Player.made.tell("error");
  await waitFor(() => expect(server.bodiesOf(path)).toHaveLength(2));
  await waitFor(() => expect(result.current.state).toBe("playing"));
  Player.made.tell("error");
  expect([result.current.state, result.current.problem]).toEqual([
    "still",
    "The recording could not be played here. Try again.",
  ]);
});

it("stands still when the device pauses it", async () => {
  const result = await playing();
  Player.made.pause();
  Player.made.tell("pause");
  expect(result.current.state).toBe("still");
});

it("asks for a new link before it goes elsewhere in a recording whose link has ended", async () => {
  server.to(path, link("https://store.example/first", 10_050));
  const result = await playing();
  await new Promise((resolve) => setTimeout(resolve, 60));
  server.to(path, link("https://store.example/second"));
  act(() => result.current.seek(40));
  await waitFor(() => expect(Player.made.src).toBe("https://store.example/second"));
  await waitFor(() => expect(Player.made.currentTime).toBe(40));
});
