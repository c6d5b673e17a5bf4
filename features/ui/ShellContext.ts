import { createContext, useContext } from "react";

export interface ShellState {
  pathname: string;
  /** first letter of who is signed in; null for a visitor */
  initial: string | null;
  barHidden: boolean;
  setBarHidden: (hidden: boolean) => void;
  /** on stage nothing surrounds the page: neither bar nor rail */
  setStage: (on: boolean) => void;
  /** a screen has come: moves the focus to its heading and says its title, but not on the first page of a visit */
  arrive: (title: string, heading: HTMLElement | null) => void;
}

export const ShellContext = createContext<ShellState>({
  pathname: "",
  initial: null,
  barHidden: false,
  setBarHidden: () => undefined,
  setStage: () => undefined,
  arrive: () => undefined,
});

export function useShell(): ShellState {
  return useContext(ShellContext);
}
