import { createContext, useContext, useEffect, useMemo, useState, type ReactNode } from "react";
import { fontFaceCss } from "./fontFaces";
import { colors, themeCss, type Scheme } from "./theme";

interface Theme {
  colors: typeof colors;
  scheme: Scheme;
  /** true while no own choice is kept on this device */
  followsSystem: boolean;
  /** null goes back to what the system says */
  setScheme: (scheme: Scheme | null) => void;
}

const storageKey = "larkspan-scheme";
const ThemeContext = createContext<Theme>({
  colors,
  scheme: "morning",
  followsSystem: true,
  setScheme: () => undefined,
});

export function useTheme(): Theme {
  return useContext(ThemeContext);
}

function storedScheme(): Scheme | null {
  try {
    const kept = window.localStorage.getItem(storageKey);
    return kept === "morning" || kept === "lamplight" ? kept : null;
  } catch {
    return null;
  }
}

function keepScheme(scheme: Scheme | null): void {
  try {
    if (scheme) window.localStorage.setItem(storageKey, scheme);
    else window.localStorage.removeItem(storageKey);
  } catch {
    // Storage may be shut off; the choice then lasts for this visit.
  }
}

const darkQuery = () =>
  typeof window.matchMedia === "function" ? window.matchMedia("(prefers-color-scheme: dark)") : null;

function installStyle(): void {
  if (document.getElementById("larkspan-style")) return;
  const style = document.createElement("style");
  style.id = "larkspan-style";
  style.textContent = fontFaceCss() + themeCss;
  document.head.append(style);
}

/** Puts fonts and colours into the page and keeps the choice between morning and lamplight. */
export function ThemeProvider({ children }: { children: ReactNode }) {
  useState(installStyle);
  const [chosen, setChosen] = useState<Scheme | null>(storedScheme);
  const [dark, setDark] = useState(() => darkQuery()?.matches ?? false);

  useEffect(() => {
    const query = darkQuery();
    const follow = () => setDark(query?.matches ?? false);
    query?.addEventListener("change", follow);
    return () => query?.removeEventListener("change", follow);
  }, []);

  useEffect(() => {
    if (chosen) document.documentElement.dataset.scheme = chosen;
    else delete document.documentElement.dataset.scheme;
  }, [chosen]);

  const theme = useMemo<Theme>(
    () => ({
      colors,
      scheme: chosen ?? (dark ? "lamplight" : "morning"),
      followsSystem: chosen === null,
      setScheme: (scheme) => {
        keepScheme(scheme);
        setChosen(scheme);
      },
    }),
    [chosen, dark],
  );
  return <ThemeContext.Provider value={theme}>{children}</ThemeContext.Provider>;
}
