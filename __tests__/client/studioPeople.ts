import type { Part } from "@/shared/contract/studio/assignment";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { Studio } from "@/shared/contract/studio/studio";

const id = (number: number) => `00000000-0000-4000-8000-${String(number).padStart(12, "0")}`;
const shares = { givenAt: "2026-09-15T18:00:00.000Z", withdrawnAt: null, waitsForGuardian: false, shares: true };

export const studioId = id(900);

/** A studio as its teacher sees it, with what is different. */
export function aStudio(change: Partial<Studio> = {}): Studio {
  return {
    id: studioId,
    name: "Tuesday evening class",
    me: { memberId: id(901), name: "Rhona Teale", role: "owner", consent: { ...shares, shares: false } },
    teachers: [{ memberId: id(901), name: "Rhona Teale", role: "owner" }],
    event: null,
    recordingsKeptDays: 90,
    counts: { pupils: 3, waiting: 0 },
    createdAt: "2026-09-15T18:00:00.000Z",
    ...change,
  };
}

/** The same as a pupil sees it. */
export function asPupil(consent: Partial<Studio["me"]["consent"]> = {}): Studio {
  return aStudio({
    me: { memberId: id(1), name: "Maren Oake", role: "pupil", consent: { ...shares, ...consent } },
    counts: null,
  });
}

/** A pupil of the roster whose comfort band begins at `low` and is an octave and a fourth wide. */
export function aPupil(number: number, name: string, low: number | null, change: Partial<RosterRow> = {}): RosterRow {
  return {
    memberId: id(number),
    name,
    role: "pupil",
    groupIds: [],
    joinedAt: "2026-09-15T18:00:00.000Z",
    consent: shares,
    voice:
      low === null
        ? null
        : {
            ...{ voiceId: id(500 + number), name: "My voice", measuredAt: "2026-11-01T18:00:00.000Z", changing: false },
            range: { lowMidi: low - 3, highMidi: low + 20 },
            comfort: { lowMidi: low, highMidi: low + 17 },
          },
    instrument: null,
    wishes: null,
    open: [],
    openCount: 0,
    lastTake: null,
    waiting: 0,
    warnings: [],
    ...change,
  };
}

/** One who has not agreed: nothing but the name. */
export const aSilentPupil = (number: number, name: string): RosterRow =>
  aPupil(number, name, null, { consent: { ...shares, givenAt: null, shares: false } });

/** A part as one side sees it. */
export function aPart(change: Partial<Part> = {}): Part {
  return {
    id: id(700),
    studio: { id: studioId, name: "Tuesday evening class" },
    title: "Slack Water",
    tonic: "D",
    songId: id(701),
    state: "assigned",
    dueOn: null,
    assignedAt: "2026-11-17T20:15:00.000Z",
    assignedBy: "Rhona Teale",
    assignmentId: id(702),
    memberId: id(1),
    pupil: "Maren Oake",
    side: "teacher",
    shares: true,
    mode: "major",
    shift: 2,
    instrument: { id: "box-adf", name: "Box guitar" },
    way: { retune: 0, capo: 2, shapeKey: "C" },
    song: { title: "Slack Water", chart: "C G", writtenKey: null, tune: null, beatsPerBar: 4, tempo: 90 },
    note: "",
    partNote: "",
    lastTake: null,
    takesHandedIn: [],
    recordingsKeptDays: 90,
    ...change,
  };
}

/** What the server says of a guardian where nobody was asked. */
export const noGuardian = {
  ...{ needed: true, age: 16, email: null, askedAt: null },
  ...{ confirmedAt: null, withdrawnAt: null, refusedAt: null },
};
