import { useEffect, useRef, type CSSProperties } from "react";
import { View } from "react-native";
import { SpanLadder } from "@/features/span/SpanLadder";
import { Card } from "@/features/ui/Card";
import { KeySign } from "@/features/ui/KeySign";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import { fonts } from "@/features/ui/theme";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { KeyPartBars } from "./KeyPartBars";
import { spellingIn, type KeyRow } from "../keyRows";
import { PeekCard } from "./PeekCard";

export interface KeyDeckProps {
  rows: readonly KeyRow[];
  /** on whole semitones */
  voice: SingingVoice;
  selected: KeyRow;
  onSelect: (row: KeyRow) => void;
}

const gap = 10;

/** The keys as cards to swipe, by pitch: the neighbours of a key are the ones a semitone away. */
export function KeyDeck({ rows, voice, selected, onSelect }: KeyDeckProps) {
  const byPitch = [...rows].sort((a, b) => a.shift - b.shift);
  const at = byPitch.indexOf(selected);
  const roomy = useLayout() !== "phone";
  const deck = useRef<HTMLDivElement>(null);
  const cards = useRef<(HTMLDivElement | null)[]>([]);
  const shown = useRef(-1);

  useEffect(() => {
    // Where the finger has already brought the card, moving it again would fight the finger.
    if (shown.current === at) return;
    const first = shown.current === -1;
    shown.current = at;
    const card = cards.current[at];
    const box = deck.current;
    if (card && box)
      box.scrollTo({
        left: card.offsetLeft - (box.clientWidth - card.clientWidth) / 2,
        behavior: first ? "instant" : "smooth",
      });
  }, [at]);

  const onScroll = () => {
    const box = deck.current;
    const width = cards.current[0]?.clientWidth ?? 0;
    if (!box || width === 0) return;
    const nearest = Math.min(byPitch.length - 1, Math.max(0, Math.round(box.scrollLeft / (width + gap))));
    const row = byPitch[nearest];
    const settled = Math.abs(box.scrollLeft - nearest * (width + gap)) < 2;
    if (row && settled && nearest !== shown.current) {
      shown.current = nearest;
      onSelect(row);
    }
  };
  const step = (by: number) => {
    const row = byPitch[at + by];
    if (row) onSelect(row);
  };
  return (
    <div
      ref={deck}
      role="group"
      aria-label={`Keys by pitch. ${selected.spoken}`}
      tabIndex={0}
      data-testid="key-deck"
      onScroll={onScroll}
      onKeyDown={(event) => {
        if (event.key !== "ArrowLeft" && event.key !== "ArrowRight") return;
        event.preventDefault();
        step(event.key === "ArrowLeft" ? -1 : 1);
      }}
      style={strip}
    >
      {byPitch.map((row, index) => (
        <div
          key={row.shift}
          ref={(card) => {
            cards.current[index] = card;
          }}
          aria-hidden={row !== selected}
          style={place}
          onClick={() => onSelect(row)}
        >
          {Math.abs(index - at) > 2 ? (
            <Card style={{ flexGrow: 1 }}>{null}</Card>
          ) : row === selected ? (
            <KeyCard row={row} voice={voice} />
          ) : (
            <PeekCard row={row} voice={voice} side={index < at ? "right" : "left"} roomy={roomy} />
          )}
        </div>
      ))}
    </div>
  );
}

/** One key in full: score, its reason, the span, and the five parts. */
function KeyCard({ row, voice }: { row: KeyRow; voice: SingingVoice }) {
  return (
    <Card selected testID="key-card" style={{ flexGrow: 1, padding: 14 }}>
      <View style={{ flexDirection: "row", justifyContent: "space-between", alignItems: "flex-end" }}>
        <KeySign of={row.key} size={52} />
        <Text variant="small" tone="soft">
          <Text
            tone={row.beyond ? "brick" : "lagoon"}
            style={{ fontFamily: fonts.display, fontWeight: "700", fontSize: 36, lineHeight: 36 }}
          >
            {row.score}
          </Text>
          {" of 100"}
        </Text>
      </View>
      <Text variant="strong" style={{ marginTop: 12, lineHeight: 21, minHeight: 63 }}>
        {row.reason}
      </Text>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 14, alignItems: "stretch", marginTop: 6 }}>
        <SpanLadder voice={voice} marks={row.marks} step={12} width={166} spelling={spellingIn(row.key)} />
        <KeyPartBars parts={row.parts} />
      </View>
    </Card>
  );
}

const strip: CSSProperties = {
  display: "flex",
  gap,
  alignItems: "stretch",
  margin: "4px -16px 0",
  padding: "2px max(44px, calc(50% - 151px))",
  overflowX: "auto",
  overflowY: "hidden",
  scrollSnapType: "x mandatory",
  scrollbarWidth: "none",
  outlineOffset: -2,
  position: "relative",
};
const place: CSSProperties = {
  flex: "0 0 min(302px, calc(100% - 0px))",
  scrollSnapAlign: "center",
  display: "flex",
  flexDirection: "column",
  minWidth: 0,
};
