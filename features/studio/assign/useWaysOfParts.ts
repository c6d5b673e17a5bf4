import type { RosterRow } from "@/shared/contract/studio/roster";
import type { Instrument } from "@/shared/instruments/instrument";
import type { KeyName } from "@/shared/music/keyName";
import type { Way } from "@/shared/ways/way";
import type { Piece } from "../judge/piece";
import type { PupilPart } from "./pupilParts";

/** A song on one pupil's instrument. */
interface WantedWays {
  piece: Piece;
  instrument: Instrument;
  wishes: RosterRow["wishes"];
}

/** Undefined while they are searched, null where there is none. */
type FoundWays = readonly Way[] | null | undefined;

/** The search for ways, as the feature that owns it offers it. */
export type UseWays = (wanted: readonly { playing: WantedWays | null; to: KeyName }[]) => readonly FoundWays[];

export interface WaysOfParts {
  /** by member */
  ways: ReadonlyMap<string, FoundWays>;
  /** how many are not found yet */
  searching: number;
}

/** The ways of the chosen pupils, each into the key of their part. */
export function useWaysOfParts(useWays: UseWays, piece: Piece, parts: readonly PupilPart[]): WaysOfParts {
  const found = useWays(
    parts.map(({ draft, key, instrument, row }) => ({
      playing: draft.chosen && instrument && piece.chords.length > 0 ? { piece, instrument, wishes: row.wishes } : null,
      to: { tonic: key.tonic, mode: piece.written.mode },
    })),
  );
  return {
    ways: new Map(parts.map(({ row }, k) => [row.memberId, found[k]] as const)),
    searching: found.filter((each) => each === undefined).length,
  };
}

/** How far the search is; "" once all are found. */
export function searchWords(searching: number, all: number): string {
  return searching > 0 ? `Working out the ways: ${all - searching} of ${all} are found.` : "";
}
