import type { Href } from "expo-router";
import type { Arrangement } from "@/shared/contract/arrangement";
import type { Song } from "@/shared/contract/song";
import type { Instrument } from "@/shared/instruments/instrument";
import type { ArrangementProposal, ArrangementWeight } from "@/shared/ways/arrangements/arrangement";
import { arrangementTitle } from "@/shared/ways/arrangements/arrangementWords";
import { weighArrangement } from "@/shared/ways/arrangements/weighArrangement";
import {
  draftOf,
  fitsInstrument,
  patternFor,
  tunedStrings,
  type ArrangedFor,
  type ArrangementDraft,
} from "./arrangementDraft";
import { keptPath, proposalPath } from "./arrangementPaths";

/** An arrangement in a list, kept or proposed. */
export interface ArrangementEntry {
  id: string;
  draft: ArrangementDraft;
  on: ArrangedFor;
  weight: ArrangementWeight;
  kept: boolean;
  href: Href;
}

/** A proposal of a way, with the first usual pattern of the song's metre. */
export function proposedEntry(proposal: ArrangementProposal, on: ArrangedFor): ArrangementEntry {
  const { id, chords, weight } = proposal;
  const { song, tonic, shift, instrument, way } = on;
  const name = arrangementTitle(proposal, tunedStrings(instrument, way.retune));
  return {
    ...{ id, on, weight },
    draft: { name, chords, pattern: patternFor(song, null) },
    kept: false,
    href: proposalPath({ songId: song.id, tonic, shift, instrumentId: instrument.id, way }, id),
  };
}

/** A kept arrangement on its own instrument; null where that is gone or has other strings by now. */
export function keptEntry(
  arrangement: Arrangement,
  song: Song,
  sequence: readonly string[],
  instruments: readonly Instrument[],
): ArrangementEntry | null {
  const instrument = instruments.find(({ id }) => id === arrangement.instrument);
  if (!instrument || !fitsInstrument(arrangement, instrument)) return null;
  const { id, tonic, shift, way, chords } = arrangement;
  return {
    id,
    draft: draftOf(arrangement, song),
    on: { song, tonic, shift, instrument, way },
    weight: weighArrangement({ chords, sequence, instrument, capo: way.capo }),
    kept: true,
    href: keptPath(arrangement),
  };
}
