import { act, cleanup, fireEvent, render, screen, waitFor } from "@testing-library/react";
import type { AnchorHTMLAttributes, ReactNode } from "react";
import { isMissingChunk, MissingChunkBoundary } from "./MissingChunkBoundary";
import { places } from "./places";
import { Screen } from "./Screen";
import { Shell } from "./Shell";
import { ThemeProvider, useTheme } from "./ThemeProvider";

let mockPathname = "/songs";
jest.mock("expo-router", () => ({
  usePathname: () => mockPathname,
  Link: ({
    href,
    children,
    "aria-label": label,
    "aria-current": current,
  }: AnchorHTMLAttributes<HTMLAnchorElement> & { children: ReactNode }) => (
    <a href={href} aria-label={label} aria-current={current}>
      {children}
    </a>
  ),
}));

function page(title: string) {
  return (
    <Shell>
      <Screen key={title} title={title}>
        <p>Words</p>
      </Screen>
    </Shell>
  );
}

describe("the shell", () => {
  beforeEach(() => {
    mockPathname = "/songs";
    window.scrollTo = jest.fn();
  });

  it("has one navigation, one main and one h1, and a way past the navigation", () => {
    render(page("Songs"));
    expect(screen.getAllByRole("navigation")).toHaveLength(1);
    expect(screen.getByRole("main").id).toBe("main");
    expect(screen.getByRole("heading", { level: 1 }).textContent).toBe("Songs");
    expect(screen.getByText("Skip to the content").getAttribute("href")).toBe("#main");
  });

  it("keeps what was typed when a phone is turned, or a window drawn wider", () => {
    const widthWas = window.innerWidth;
    const turnTo = (width: number) =>
      act(() => {
        Object.defineProperty(document.documentElement, "clientWidth", { configurable: true, value: width });
        Object.defineProperty(window, "innerWidth", { configurable: true, value: width });
        window.dispatchEvent(new Event("resize"));
      });
    turnTo(390);
    render(
      <Shell>
        <Screen title="Words">
          <input aria-label="words" defaultValue="" />
        </Screen>
      </Shell>,
    );
    const bars = screen.getAllByRole("navigation").length;
    const field = screen.getByLabelText("words");
    fireEvent.change(field, { target: { value: "salt on the window" } });
    turnTo(1440);
    expect(screen.getByLabelText("words")).toBe(field);
    turnTo(390);
    expect(screen.getByLabelText("words")).toBe(field);
    expect(screen.getAllByRole("navigation")).toHaveLength(bars);
    turnTo(widthWas);
  });

  it("marks the place where one is", () => {
    render(page("Songs"));
    expect(screen.getByText("Songs", { selector: "a *" }).closest("a")?.getAttribute("aria-current")).toBe("page");
  });

  it("leaves the focus alone on the first page, and moves it with title and words on the next", () => {
    const { rerender } = render(page("Songs"));
    expect(document.title).toBe("Songs · Larkspan");
    expect(document.activeElement).toBe(document.body);
    mockPathname = "/voice";
    rerender(page("Your voice"));
    expect(document.title).toBe("Your voice · Larkspan");
    expect(document.activeElement).toBe(screen.getByRole("heading", { level: 1 }));
    expect(screen.getByRole("status").textContent).toBe("Your voice");
    expect(window.scrollTo).toHaveBeenCalledWith(0, 0);
  });

  it("moves the focus on to the heading of the page that takes the place of its skeleton", () => {
    const { rerender } = render(page("Songs"));
    mockPathname = "/songs/7";
    rerender(page("Song"));
    rerender(page("Slack Water"));
    expect(document.activeElement).toBe(screen.getByRole("heading", { name: "Slack Water" }));
    expect(screen.getByRole("status").textContent).toBe("Slack Water");
  });

  it("leaves the focus alone where the first page takes the place of its skeleton", () => {
    const { rerender } = render(page("Song"));
    rerender(page("Slack Water"));
    expect(document.activeElement).toBe(document.body);
  });

  it("does not move the focus when a page only changes its title", () => {
    const { rerender } = render(page("Songs"));
    rerender(page("Songs, searched"));
    expect(document.activeElement).toBe(document.body);
  });
});

describe("the places", () => {
  it.each([
    ["/", "Voice"],
    ["/voice/sing", "Voice"],
    ["/songs/1/keys", "Songs"],
    ["/instruments", "Instruments"],
    ["/account", undefined],
  ])("%s belongs to %s", (path, label) => {
    expect(places.find((place) => place.within.test(path))?.label).toBe(label);
  });
});

function SchemeSwitch() {
  const { scheme, followsSystem, setScheme } = useTheme();
  return (
    <>
      <p>{`${scheme}, ${followsSystem ? "as the system" : "chosen"}`}</p>
      <button onClick={() => setScheme("lamplight")}>lamp</button>
      <button onClick={() => setScheme(null)}>system</button>
    </>
  );
}

describe("the scheme", () => {
  beforeEach(() => localStorage.clear());

  it("follows the system until one is chosen, and is kept on the device", () => {
    const { unmount } = render(
      <ThemeProvider>
        <SchemeSwitch />
      </ThemeProvider>,
    );
    expect(screen.getByText("morning, as the system")).toBeTruthy();
    fireEvent.click(screen.getByText("lamp"));
    expect(document.documentElement.dataset.scheme).toBe("lamplight");
    unmount();
    render(
      <ThemeProvider>
        <SchemeSwitch />
      </ThemeProvider>,
    );
    expect(screen.getByText("lamplight, chosen")).toBeTruthy();
    fireEvent.click(screen.getByText("system"));
    expect(document.documentElement.dataset.scheme).toBeUndefined();
    expect(localStorage.getItem("larkspan-scheme")).toBeNull();
  });

  it("puts colours and fonts into the page once", () => {
    render(
      <ThemeProvider>
        <ThemeProvider>
          <p />
        </ThemeProvider>
      </ThemeProvider>,
    );
    const sheets = document.querySelectorAll("#larkspan-style");
    expect(sheets).toHaveLength(1);
    expect(sheets[0]?.textContent).toContain("@font-face");
  });
});

describe("what breaks below the shell", () => {
  function Broken(): ReactNode {
    throw new Error("a bug");
  }
  function Missing(): ReactNode {
    throw new Error("Loading module /x.js failed.");
  }
  const openMissing = () => {
    const reload = jest.fn();
    render(
      <MissingChunkBoundary path="/songs/7" reload={reload}>
        <Missing />
      </MissingChunkBoundary>,
    );
    return reload;
  };
  const answerWith = (answer: () => Promise<{ status: number }>) => {
    globalThis.fetch = jest.fn(answer) as unknown as typeof fetch;
  };
  let quiet: jest.SpyInstance;
  beforeEach(() => {
    sessionStorage.clear();
    quiet = jest.spyOn(console, "error").mockImplementation(() => undefined);
  });
  afterEach(() => {
    quiet.mockRestore();
    jest.restoreAllMocks();
    Reflect.deleteProperty(globalThis, "fetch");
  });

  it("is never reloaded while offline, and can be tried again when the page answers", async () => {
    jest.spyOn(navigator, "onLine", "get").mockReturnValue(false);
    answerWith(async () => ({ status: 200 }));
    const reload = openMissing();
    expect(await screen.findByText("Larkspan cannot be reached")).toBeTruthy();
    expect(fetch).not.toHaveBeenCalled();
    jest.spyOn(navigator, "onLine", "get").mockReturnValue(true);
    answerWith(() => Promise.reject(new TypeError("no network")));
    fireEvent.click(screen.getByRole("button", { name: "Try again" }));
    await waitFor(() => expect(fetch).toHaveBeenCalled());
    expect(await screen.findByText("Larkspan cannot be reached")).toBeTruthy();
    expect(reload).not.toHaveBeenCalled();
    answerWith(async () => ({ status: 200 }));
    fireEvent.click(screen.getByRole("button", { name: "Try again" }));
    await waitFor(() => expect(reload).toHaveBeenCalledTimes(1));
  });

  it("is fetched by one reload after a new version, and not by a second one", async () => {
    answerWith(async () => ({ status: 200 }));
    const first = openMissing();
    await waitFor(() => expect(first).toHaveBeenCalledTimes(1));
    cleanup();
    const second = openMissing();
    await waitFor(() => expect(fetch).toHaveBeenCalledTimes(2));
    expect(await screen.findByText("This page could not be fetched")).toBeTruthy();
    expect(second).not.toHaveBeenCalled();
  });

  it("tells a missing part of the program from another error", () => {
    const missing = new Error("Loading module /x.js failed.");
    missing.name = "AsyncRequireError";
    expect(isMissingChunk(missing)).toBe(true);
    expect(isMissingChunk(new Error("Failed to fetch dynamically imported module"))).toBe(true);
    // A page of the new version asks the old program for what it does not have.
    expect(isMissingChunk(new Error('Requiring unknown module "1204".'))).toBe(true);
    expect(isMissingChunk(new Error("x is not a function"))).toBe(false);
    expect(isMissingChunk("text")).toBe(false);
  });

  it("is said in words, with a way out, until another page is opened", () => {
    const { rerender } = render(
      <MissingChunkBoundary path="/songs">
        <Broken />
      </MissingChunkBoundary>,
    );
    expect(screen.getByRole("alert").textContent).toContain("This page broke");
    expect(screen.getByRole("button", { name: "Load again" })).toBeTruthy();
    rerender(
      <MissingChunkBoundary path="/voice">
        <p>Your voice</p>
      </MissingChunkBoundary>,
    );
    expect(screen.getByText("Your voice")).toBeTruthy();
  });
});
