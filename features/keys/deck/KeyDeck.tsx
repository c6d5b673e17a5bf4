import { useEffect, useRef, type CSSProperties } from "react";
import { View } from "react-native";
import { SpanLadder } from "@/features/span/SpanLadder";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { IconButton } from "@/features/ui/IconButton";
import { KeySign } from "@/features/ui/KeySign";
import { LiveText } from "@/features/ui/LiveText";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import { fonts } from "@/features/ui/theme";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { Pinning } from "../compare/pins";
import { KeyPartBars } from "./KeyPartBars";
import { spellingIn, type KeyRow } from "../keyRows";
import { PeekCard } from "./PeekCard";

export interface KeyDeckProps {
  /** best first */
  rows: readonly KeyRow[];
  /** on whole semitones */
  voice: SingingVoice;
  selected: KeyRow;
  onSelect: (row: KeyRow) => void;
  pinning: Pinning;
}

const gap = 10;

/** The keys as cards to swipe, best first, with buttons for those who do not swipe. */
export function KeyDeck({ rows, voice, selected, onSelect, pinning }: KeyDeckProps) {
  const at = rows.indexOf(selected);
  const roomy = useLayout() !== "phone";
  const deck = useRef<HTMLDivElement>(null);
  const cards = useRef<(HTMLDivElement | null)[]>([]);
  const shown = useRef(-1);

  useEffect(() => {
    // Where the finger has already brought the card, moving it again would fight the finger.
    if (shown.current === at) return;
    const first = shown.current === -1;
    shown.current = at;
    const box = deck.current;
    const place = box ? placesOf(box, cards.current)[at] : undefined;
    const calm = window.matchMedia?.("(prefers-reduced-motion: reduce)").matches ?? false;
    if (box && place !== undefined) box.scrollTo({ left: place, behavior: first || calm ? "instant" : "smooth" });
  }, [at]);

  const onScroll = () => {
    const box = deck.current;
    if (!box) return;
    const places = placesOf(box, cards.current);
    const stands = (place: number | undefined) => place !== undefined && Math.abs(box.scrollLeft - place) < 2;
    // At the end of a broad deck several cards share one place.
    if (stands(places[shown.current])) return;
    const settled = places.findIndex(stands);
    const row = rows[settled];
    if (row) {
      shown.current = settled;
      onSelect(row);
    }
  };
  const go = (place: number) => {
    const row = rows[Math.min(rows.length - 1, Math.max(0, place))];
    if (row) onSelect(row);
  };
  const isPinned = pinning.has(selected);
  return (
    <>
      <div
        ref={deck}
        role="group"
        aria-label={`Keys, best first. ${at + 1} of ${rows.length}: ${selected.spoken}`}
        tabIndex={0}
        data-testid="key-deck"
        onScroll={onScroll}
        onKeyDown={(event) => {
          const target = deckTarget(event.key, at, rows.length);
          if (target === null) return;
          event.preventDefault();
          go(target);
        }}
        style={strip}
      >
        {rows.map((row, index) => (
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
            ) : row === selected || roomy ? (
              <KeyCard row={row} voice={voice} selected={row === selected} />
            ) : (
              <PeekCard row={row} voice={voice} side={index < at ? "right" : "left"} />
            )}
          </div>
        ))}
      </div>
      <View style={{ flexDirection: "row", alignItems: "center", marginTop: 4, marginHorizontal: -8 }}>
        <IconButton
          icon="back"
          label="Better key"
          disabled={at <= 0}
          onPress={() => go(at - 1)}
          testID="previous-key"
        />
        <LiveText variant="small" tone="soft">
          {at === 0 ? `Best of ${rows.length}` : `${at + 1} of ${rows.length}, best first`}
        </LiveText>
        <IconButton
          icon="forward"
          label="Next best key"
          disabled={at >= rows.length - 1}
          onPress={() => go(at + 1)}
          testID="next-key"
        />
        <View style={{ flexGrow: 1 }} />
        <Button
          kind="text"
          small
          icon={isPinned ? "bookmarkFilled" : "bookmark"}
          label={isPinned ? `Unpin ${selected.sign}` : `Pin ${selected.sign}`}
          disabled={!isPinned && !pinning.room}
          onPress={() => pinning.turn(selected)}
          testID="pin-key"
        />
      </View>
    </>
  );
}

/** Where a key of the keyboard leads from one card; null for other keys. */
export function deckTarget(key: string, at: number, count: number): number | null {
  if (key === "ArrowLeft") return Math.max(0, at - 1);
  if (key === "ArrowRight") return Math.min(count - 1, at + 1);
  if (key === "Home") return 0;
  return key === "End" ? count - 1 : null;
}

/** Where the deck stands when each card lies in the middle of it, or as near to that as its ends allow. */
function placesOf(box: HTMLDivElement, cards: readonly (HTMLDivElement | null)[]): number[] {
  const most = box.scrollWidth - box.clientWidth;
  return cards.map((card) => {
    const middle = card ? card.offsetLeft - (box.clientWidth - card.clientWidth) / 2 : 0;
    return Math.min(most, Math.max(0, middle));
  });
}

/** One key in full: score, its reason, the span, and the five parts. */
function KeyCard({ row, voice, selected }: { row: KeyRow; voice: SingingVoice; selected: boolean }) {
  return (
    <Card
      selected={selected}
      testID={selected ? "key-card" : "next-card"}
      style={{ flexGrow: 1, padding: selected ? 14 : 15 }}
    >
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
  padding: "2px 16px",
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
