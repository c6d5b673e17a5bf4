import { G, Path } from "react-native-svg";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { spread } from "./ladderGeometry";

/** A pitch named at the right of the ladder. */
export interface LadderLabel {
  midi: number;
  /** "C5", glyphs allowed */
  name: string;
  /** "highest held" */
  text: string;
  tone: "comfort" | "reach" | "ink";
}

export interface LadderLabelsProps {
  labels: readonly LadderLabel[];
  /** height of a pitch */
  y: (midi: number) => number;
  /** where the leads begin */
  x: number;
  /** lines of words beside a bracket over the comfort labels */
  bracket?: readonly string[] | undefined;
}

const tones = { comfort: colors.lagoon, reach: colors.honeyText, ink: colors.ink } as const;

/** Names at the right: a lead from the rung, the note large, what it is small. Close ones are moved apart. */
export function LadderLabels({ labels, y, x, bracket }: LadderLabelsProps) {
  const sorted = [...labels].sort((a, b) => b.midi - a.midi);
  const places = spread(
    sorted.map((label) => y(label.midi)),
    22,
  );
  const wordsX = x + (sorted.some((label) => /[♯♭]/.test(label.name)) ? 66 : 56);
  const comfort = sorted.flatMap((label, index) => (label.tone === "comfort" ? [places[index] ?? 0] : []));
  const from = Math.min(...comfort) + 16;
  const to = Math.max(...comfort) - 16;
  const middle = (from + to) / 2;
  const lines = bracket ?? [];
  return (
    <G>
      {sorted.map((label, index) => {
        const at = places[index] ?? 0;
        return (
          <G key={`${label.midi}${label.text}`}>
            <Path d={`M${x} ${y(label.midi)}L${x + 10} ${at}`} stroke={colors.inkSoft} strokeWidth={1} fill="none" />
            <SvgLabel x={x + 18} y={at + 6} size={20} family="display" weight="700" fill={colors.ink}>
              {label.name}
            </SvgLabel>
            <SvgLabel x={wordsX} y={at + 5} size={14} weight="500" fill={tones[label.tone]}>
              {label.text}
            </SvgLabel>
          </G>
        );
      })}
      {comfort.length > 1 && lines.length > 0 && to - from > lines.length * 18 && (
        <G>
          <Path
            d={`M${x + 5} ${from}V${to}`}
            stroke={colors.lagoon}
            strokeWidth={2.5}
            strokeLinecap="round"
            fill="none"
          />
          {lines.map((line, index) => (
            <SvgLabel
              key={line}
              x={x + 18}
              y={middle + 5 + (index - (lines.length - 1) / 2) * 18}
              size={14}
              weight="500"
              fill={colors.ink}
            >
              {line}
            </SvgLabel>
          ))}
        </G>
      )}
    </G>
  );
}
