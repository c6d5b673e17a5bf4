import type { Instrument } from "@/shared/instruments/instrument";
import type { AssignmentRequest } from "@/shared/contract/studio/assignment";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { KeyName } from "@/shared/music/keyName";
import type { Way } from "@/shared/ways/way";
import type { PupilsJudged } from "../judge/judgePupils";
import { keyOptions, proposedOption, unjudgedReason, type KeyOption } from "./keyOptions";

/** What the teacher changed for one pupil; what is null is as proposed. */
export interface PartDraft {
  chosen: boolean;
  shift: number | null;
  /** `wayMark` of the way */
  way: string | null;
  note: string;
}

export const untouched: PartDraft = { chosen: false, shift: null, way: null, note: "" };

/** One pupil in the table of an assignment: what is proposed, what was changed, what it comes to. */
export interface PupilPart {
  row: RosterRow;
  draft: PartDraft;
  options: readonly KeyOption[];
  key: KeyOption;
  instrument: Instrument | null;
}

/** Tells a way from the others of its key. */
export const wayMark = ({ retune, capo, shapeKey }: Pick<Way, "retune" | "capo" | "shapeKey">): string =>
  `${retune} ${capo} ${shapeKey}`;

export interface PartsOf {
  written: KeyName;
  pupils: readonly RosterRow[];
  judged: PupilsJudged | undefined;
  drafts: ReadonlyMap<string, PartDraft>;
  /** tonic of one key for all; null: each their own */
  asked: string | null;
  instrumentOf: (own: NonNullable<RosterRow["instrument"]>) => Instrument;
}

/** The table of an assignment, a line for each pupil. */
export function pupilParts({ written, pupils, judged, drafts, asked, instrumentOf }: PartsOf): PupilPart[] {
  return pupils.map((row) => {
    const draft = drafts.get(row.memberId) ?? untouched;
    const options = keyOptions(written, judged?.each[row.memberId]);
    const key = options.find(({ shift }) => shift === draft.shift) ?? proposedOption(options, asked);
    return { row, draft, options, key, instrument: row.instrument && instrumentOf(row.instrument) };
  });
}

/** The way that a part gets: the one chosen, else the best; null where none is known. */
export function partWay({ draft }: Pick<PupilPart, "draft">, ways: readonly Way[] | null | undefined): Way | null {
  if (!ways) return null;
  return ways.find((way) => wayMark(way) === draft.way) ?? ways[0] ?? null;
}

const longestReason = 300;

/** The part as the server takes it. */
export function partRequest(
  part: PupilPart,
  ways: readonly Way[] | null | undefined,
): AssignmentRequest["parts"][number] {
  const { row, draft, key, instrument } = part;
  const way = partWay(part, ways);
  const reason = key.judged?.reason ?? unjudgedReason;
  return {
    memberId: row.memberId,
    tonic: key.tonic,
    shift: key.shift,
    score: key.judged?.score ?? null,
    reason: reason.length > longestReason ? `${reason.slice(0, longestReason - 1)}…` : reason,
    instrument: instrument && { id: instrument.id, name: instrument.name },
    way: way && { retune: way.retune, capo: way.capo, shapeKey: way.shapeKey },
    note: draft.note.trim(),
  };
}
