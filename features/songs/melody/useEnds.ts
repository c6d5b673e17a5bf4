import { useEffect, useRef, useState } from "react";
import type { Song } from "@/shared/contract/song";
import { tonicPitchClass } from "@/shared/music/keyName";
import { glyphs, noteName, pitchClass } from "@/shared/music/pitch";
import { tuneSpan } from "@/shared/songs/tuneSpan";
import { deviceDraft } from "@/features/api/deviceDraft";
import type { SpanTexts } from "./SpanByHand";
import { spellingOfHome } from "./spellingOfHome";

const drafts = deviceDraft<SpanTexts>("ends-draft");
const same = (a: SpanTexts, b: SpanTexts) => a.home === b.home && a.low === b.low && a.high === b.high;

/** The ends of a tune as typed: what was not kept is found again. */
export function useEnds(song: Song) {
  const base = useRef(endsOf(song));
  const [found, setFound] = useState(() => drafts.load(song.id));
  const [ends, setEnds] = useState(found ?? base.current);
  useEffect(() => {
    if (same(ends, base.current)) drafts.clear(song.id);
    else drafts.save(song.id, ends);
  }, [song.id, ends]);
  return {
    ends,
    setEnds,
    found: found !== null,
    giveUp: () => {
      setEnds(base.current);
      setFound(null);
      // The button that was pressed is gone with its notice.
      document.querySelector("h1")?.focus({ preventScroll: true });
    },
    letGo: () => {
      base.current = ends;
      drafts.clear(song.id);
    },
  };
}

/** What the fields of the ends begin with: the ends that are known, the home note over the lowest. */
function endsOf({ tune, writtenKey }: Song): SpanTexts {
  const home = tune?.home ?? writtenKey?.tonic;
  if (home === undefined) return { home: "", low: "", high: "" };
  const span = tuneSpan(tune);
  if (!span) return { home: glyphs(`${home}4`), low: "", high: "" };
  const name = (midi: number) => glyphs(noteName(midi, spellingOfHome(home)));
  const { lowMidi, highMidi } = span;
  return {
    home: name(lowMidi + pitchClass(tonicPitchClass(home) - lowMidi)),
    low: name(lowMidi),
    high: name(highMidi),
  };
}
