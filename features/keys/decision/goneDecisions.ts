import { useState } from "react";
import { session } from "@/features/api/session";
import { type Decision, decision as decisionContract } from "@/shared/contract/decision";

/** A decision that was taken back or let go of, and whose it was. */
interface Gone {
  account: string | null;
  goneAt: string;
  decision: Decision;
}

export interface GoneDecisions {
  /** newest first; only of whoever is here */
  gone: readonly Decision[];
  keep: (decision: Decision) => void;
  forget: (decision: Decision) => void;
}

const storageKey = "larkspan.gone-decisions";
const mostKept = 30;
const keptMs = 30 * 24 * 3_600_000;

/** What was let go of, as this device remembers it for a month, so that it can be brought back after a reload too. */
export function useGoneDecisions(): GoneDecisions {
  const [all, setAll] = useState(() => readGone(stored(), Date.now()));
  const account = session.current().account?.id ?? null;
  const change = (next: Gone[]) => {
    setAll(next);
    store(next);
  };
  return {
    gone: all.filter((each) => each.account === account).map(({ decision }) => decision),
    keep: (decision) => {
      const now = { account, goneAt: new Date().toISOString(), decision };
      change([now, ...without(all, decision)].slice(0, mostKept));
    },
    forget: (decision) => change(without(all, decision)),
  };
}

/** What was kept, newest first; what is too old or cannot be read is left out. */
export function readGone(text: string | null, nowMs: number): Gone[] {
  let kept: unknown;
  try {
    kept = JSON.parse(text ?? "[]");
  } catch {
    return [];
  }
  if (!Array.isArray(kept)) return [];
  return kept.flatMap((each: Partial<Record<keyof Gone, unknown>> | null) => {
    const read = decisionContract.safeParse(each?.decision);
    const [account, goneAt] = [each?.account, each?.goneAt];
    if (!read.success || typeof goneAt !== "string" || !(nowMs - Date.parse(goneAt) < keptMs)) return [];
    return [{ account: typeof account === "string" ? account : null, goneAt, decision: read.data }];
  });
}

/** One id serves all choices for a song and voice; the moment of the choice tells them apart. */
function without(all: readonly Gone[], { id, decidedAt }: Decision): Gone[] {
  return all.filter(({ decision }) => decision.id !== id || decision.decidedAt !== decidedAt);
}

function stored(): string | null {
  try {
    return window.localStorage.getItem(storageKey);
  } catch {
    return null;
  }
}

function store(all: readonly Gone[]): void {
  try {
    window.localStorage.setItem(storageKey, JSON.stringify(all));
  } catch {
    // Storage may be shut off; it can then be brought back while the page is open.
  }
}
