import { act, renderHook, waitFor } from "@testing-library/react";
import { useWakeLock } from "./useWakeLock";

/** A browser's lock: what was asked for, and the way to take it back as a browser does when the page is hidden. */
function giveLock(request: () => Promise<unknown>) {
  Object.defineProperty(navigator, "wakeLock", { configurable: true, value: { request } });
}

function makeSentinel() {
  const listeners: (() => void)[] = [];
  return {
    release: jest.fn(() => Promise.resolve()),
    addEventListener: (_: "release", listener: () => void) => listeners.push(listener),
    takenBack: () => listeners.forEach((listener) => listener()),
  };
}

afterEach(() => Reflect.deleteProperty(navigator, "wakeLock"));

it("keeps the screen on while the stage is open, and lets it go afterwards", async () => {
  const sentinel = makeSentinel();
  giveLock(() => Promise.resolve(sentinel));
  const { result, unmount } = renderHook(useWakeLock);
  expect(result.current).toBe("asking");
  await waitFor(() => expect(result.current).toBe("held"));
  expect(sentinel.release).not.toHaveBeenCalled();
  unmount();
  expect(sentinel.release).toHaveBeenCalledTimes(1);
});

it("asks again when somebody comes back to a page whose lock the browser took away", async () => {
  const sentinel = makeSentinel();
  const request = jest.fn(() => Promise.resolve(sentinel));
  giveLock(request);
  const { result } = renderHook(useWakeLock);
  await waitFor(() => expect(result.current).toBe("held"));
  act(() => void document.dispatchEvent(new Event("visibilitychange")));
  expect(request).toHaveBeenCalledTimes(1);
  act(() => {
    sentinel.takenBack();
    document.dispatchEvent(new Event("visibilitychange"));
  });
  await waitFor(() => expect(request).toHaveBeenCalledTimes(2));
});

it("says so where the browser refuses or has no such lock", async () => {
  expect(renderHook(useWakeLock).result.current).toBe("unknown-here");
  giveLock(() => Promise.reject(new Error("low battery")));
  const { result } = renderHook(useWakeLock);
  await waitFor(() => expect(result.current).toBe("refused"));
});
