import { useState, type ReactNode } from "react";
import { EmptyState } from "@/features/ui/EmptyState";
import { Button } from "@/features/ui/Button";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { Pinning } from "../compare/pins";
import { KeyLegend } from "../KeyLegend";
import type { KeyRow } from "../keyRows";
import { roomWords } from "../partWords";
import { isFiltering, noFilter, remainingRows, type KeyFilter } from "./keyFilter";
import { KeySentence } from "./KeySentence";
import { KeyTable } from "./KeyTable";
import { bestFirst, sortedRows, type KeyOrder } from "./keyOrder";
import { PrintSheet } from "./PrintSheet";
import { bestWay, type FoundWays } from "./tableWays";

export interface WideKeysProps {
  /** best first */
  rows: readonly KeyRow[];
  /** on whole semitones */
  voice: SingingVoice;
  selected: KeyRow;
  onSelect: (row: KeyRow) => void;
  pinning: Pinning;
  waysOf: (row: KeyRow) => FoundWays;
  /** its strings in words and the list to choose from; null where the song has no chords */
  instrument: { strings: string; chooser: ReactNode } | null;
  markOf: (row: KeyRow) => string | null;
}

/** The table of keys with the sentence that says which ones, in what order, and played on what. */
export function WideKeys({ rows, voice, selected, onSelect, pinning, waysOf, instrument, markOf }: WideKeysProps) {
  const [order, setOrder] = useState<KeyOrder>(bestFirst);
  const [filter, setFilter] = useState<KeyFilter>(noFilter);
  const { rows: left, searching } = remainingRows(rows, filter, waysOf);
  const facts = { pinned: pinning.has, wayOf: (row: KeyRow) => bestWay(waysOf(row), filter) };
  return (
    <>
      <PrintSheet zoom={0.7} />
      <KeySentence
        rows={rows}
        filter={filter}
        onFilter={setFilter}
        order={order}
        onOrder={setOrder}
        chooser={instrument?.chooser ?? null}
        left={left.length}
        searching={searching}
        pinning={pinning}
      />
      {left.length === 0 && isFiltering(filter) ? (
        <EmptyState
          testID="no-key-left"
          title="No key fits all of this"
          text="Ask for less: another instrument, more sharps or flats, a capo or a barre."
          action={<Button small label="Show all twelve keys" onPress={() => setFilter(noFilter)} />}
        />
      ) : (
        <KeyTable
          {...facts}
          rows={sortedRows(left, order, facts)}
          all={rows}
          voice={voice}
          selected={selected}
          onSelect={onSelect}
          pinRoom={pinning.room}
          onPin={pinning.turn}
          order={order}
          onOrder={setOrder}
          instrument={instrument?.strings ?? null}
          markOf={markOf}
        />
      )}
      <KeyLegend>{roomWords(selected)}</KeyLegend>
    </>
  );
}
