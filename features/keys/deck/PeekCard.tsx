import { View } from "react-native";
import Svg, { G, Line, Rect } from "react-native-svg";
import { Hatch, useDrawingId } from "@/features/span/Hatch";
import { isNatural, ladderScale, yOf } from "@/features/span/ladderGeometry";
import { Card } from "@/features/ui/Card";
import { KeySign } from "@/features/ui/KeySign";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { KeyRow } from "../keyRows";

const step = 12;
/** room over the top rung of the ladder on a full card, so that rungs go on from card to card */
const pad = 8;

export interface PeekCardProps {
  row: KeyRow;
  voice: SingingVoice;
  side: "left" | "right";
}

/** A neighbour of the card in the middle: only the edge that shows, its marks at the heights they have on the full card. */
export function PeekCard({ row, voice, side }: PeekCardProps) {
  const width = 30;
  // Behind the last card in sight more of the next one shows than between two.
  const drawn = side === "left" ? 64 : width;
  const id = useDrawingId();
  const scale = ladderScale(voice, row.marks, 0);
  const y = (midi: number) => yOf(midi, scale, step, pad);
  const rungs = Array.from({ length: scale.high - scale.low + 1 }, (_, index) => scale.low + index).filter(isNatural);
  return (
    <Card
      style={{ flexGrow: 1, padding: 0, alignItems: side === "left" ? "flex-start" : "flex-end", overflow: "hidden" }}
    >
      <View style={{ width, alignItems: "center", paddingTop: 18, height: 141 }}>
        <KeySign of={row.key} size={row.key.mode === "minor" && row.sign.length > 2 ? 15 : 20} stacked />
        <Text variant="mono" tone="soft" style={{ fontSize: 12, lineHeight: 18 }}>
          {row.score}
        </Text>
      </View>
      <Svg width={drawn} height={y(scale.low) + pad} aria-hidden>
        <Hatch id={id} pitch={4} line={1.6} />
        {rungs.map((midi) => (
          <Line
            key={midi}
            x1={0}
            x2={drawn}
            y1={y(midi)}
            y2={y(midi)}
            stroke={midi % 12 === 0 ? mixtures.rungC : colors.line}
            strokeWidth={1}
          />
        ))}
        {row.marks.map((mark) => {
          const long = Math.min(60, Math.max(8, mark.share * 400));
          const box = {
            x: side === "left" ? 10 : width - 10 - long,
            y: y(mark.midi) - 4,
            width: long,
            height: 8,
            rx: 4,
          };
          if (mark.zone === "comfort") return <Rect key={mark.midi} {...box} fill={colors.ink} />;
          return (
            <G key={mark.midi}>
              <Rect
                {...box}
                fill={mark.zone === "reach" ? `url(#${id})` : "none"}
                stroke={mark.zone === "reach" ? colors.honey : colors.brick}
                strokeWidth={1.5}
                {...(mark.zone === "beyond" ? { strokeDasharray: "0.1 3.2", strokeLinecap: "round" as const } : null)}
              />
            </G>
          );
        })}
      </Svg>
    </Card>
  );
}
