import type { Href } from "expo-router";
import type { PartState } from "@/shared/contract/studio/assignment";
import { dueWords } from "./dayWords";

/** To what a pupil is working on, or has handed in. */
export const partPath = (partId: string): Href => `/studio/parts/${partId}` as Href;

/** Where a part stands, for its teacher and for its pupil. */
export const stateWords: Record<"teacher" | "pupil", Record<PartState, string>> = {
  teacher: {
    assigned: "not handed in yet",
    "handed-in": "waits for your ear",
    returned: "to be sung again",
    accepted: "accepted",
  },
  pupil: {
    assigned: "to sing",
    "handed-in": "handed in, your teacher will listen",
    returned: "your teacher would like to hear it again",
    accepted: "accepted",
  },
};

/** Colours of words about a state; the words say it all. */
export const stateTone = {
  assigned: "soft",
  "handed-in": "plum",
  returned: "honey",
  accepted: "lagoon",
} as const satisfies Record<PartState, string>;

/** Due dates matter until a part is accepted. */
export function partDue(state: PartState, dueOn: string | null, now: Date): string | null {
  return dueOn === null || state === "accepted" ? null : dueWords(dueOn, now);
}

interface InList {
  state: PartState;
  dueOn: string | null;
  assignedAt: string;
}

const rank: Record<PartState, number> = { returned: 0, assigned: 0, "handed-in": 1, accepted: 2 };

/** What is to be done first: by due date, then the newest; what is done stands last. */
export function inOrderOfWork<Part extends InList>(parts: readonly Part[]): Part[] {
  const due = ({ dueOn }: InList) => dueOn ?? "9999";
  return [...parts].sort(
    (a, b) => rank[a.state] - rank[b.state] || due(a).localeCompare(due(b)) || b.assignedAt.localeCompare(a.assignedAt),
  );
}
