import type { Href } from "expo-router";
import type { Arrangement } from "@/shared/contract/arrangement";
import type { ArrangedFor } from "./arrangementDraft";
import { wayAddress, type WayAddress, type WayMoves } from "@/shared/ways/askedWay";

/** What the address of an arrangement may ask for. */
export interface ArrangementAddress extends WayAddress {
  key?: string;
  shift?: string;
  instrument?: string;
  /** the chord that is open on the neck, as written */
  chord?: string;
}

/** Key, instrument and way that arrangements are of. */
export interface ArrangedWay {
  songId: string;
  tonic: string;
  shift: number;
  instrumentId: string;
  way: WayMoves;
}

function params({ songId, tonic, shift, instrumentId, way }: ArrangedWay) {
  return { id: songId, key: tonic, shift: String(shift), instrument: instrumentId, ...wayAddress(way) };
}

/** The arrangements of one way. */
export function arrangementsPath(of: ArrangedWay): Href {
  return { pathname: "/songs/[id]/arrangements", params: params(of) };
}

/** One that is not kept yet: by the id of a proposal, or "way" for the way's own shapes. */
export function proposalPath(of: ArrangedWay, proposal: string, chord?: string): Href {
  return {
    pathname: "/songs/[id]/arrangements/[arrangementId]",
    params: { ...params(of), arrangementId: proposal, ...(chord === undefined ? null : { chord }) },
  };
}

/** Ways on from each way of a key: to its arrangements, and to one of its chords on the whole neck. */
export function wayLinks(of: Omit<ArrangedWay, "way">) {
  return {
    arrange: (way: WayMoves) => arrangementsPath({ ...of, way }),
    onNeck: (way: WayMoves, { written }: { written: string }) => proposalPath({ ...of, way }, "way", written),
  };
}

/** One that is kept. */
export function keptPath({ id, songId }: Pick<Arrangement, "id" | "songId">): Href {
  return { pathname: "/songs/[id]/arrangements/[arrangementId]", params: { id: songId, arrangementId: id } };
}

/** The sheet that shows a kept arrangement. */
export function sheetPath({ id, songId, tonic, shift, instrument, way }: Arrangement): Href {
  const of = params({ songId, tonic, shift, instrumentId: instrument, way });
  return { pathname: "/songs/[id]/sheet", params: { ...of, arrangement: id } };
}

/** Whether an address names a kept arrangement, and not a proposal. */
export function isKeptId(id: string): boolean {
  return /^[0-9a-f]{8}-/i.test(id);
}

/** Where the unsaved changes of an arrangement stand on this device. */
export function draftPlace({ id, kept, on }: { id: string; kept: boolean; on: ArrangedFor }): string {
  if (kept) return id;
  const { song, tonic, instrument, way } = on;
  return [song.id, tonic, instrument.id, ...Object.values(wayAddress(way)), id].join(" ");
}
