import { colors, fonts } from "@/features/ui/theme";
import { partMaxima } from "@/shared/keys/keyParts";
import type { KeyParts } from "@/shared/keys/keyScore";

export interface PartBarProps {
  part: keyof KeyParts;
  points: number;
  /** px there are */
  width: number;
  /** what was measured */
  words: string;
}

/** Room for "50 of 50" beside the bar. */
const figures = 76;
const hatch = `repeating-linear-gradient(135deg, ${colors.honey} 0 2px, ${colors.paper} 2px 4px)`;

/** One part of a score: a bar on the scale of all parts, its points, and what they stand for. */
export function PartBar({ part, points, width, words }: PartBarProps) {
  const most = partMaxima[part];
  const point = Math.min(4, (width - figures) / 50);
  return (
    <>
      <div style={{ display: "flex", alignItems: "center", justifyContent: "space-between", height: 20 }}>
        <span aria-hidden style={{ position: "relative", width: most * point, height: 8, flexShrink: 0 }}>
          <span
            style={{
              position: "absolute",
              inset: 0,
              borderRadius: 2,
              boxShadow: `inset 0 0 0 1px color-mix(in srgb, ${colors.inkSoft} 60%, ${colors.line})`,
            }}
          />
          <span
            style={{
              position: "absolute",
              left: 0,
              top: 0,
              height: 8,
              borderRadius: 2,
              width: points * point,
              background: points / most < 0.6 ? hatch : colors.lagoon,
            }}
          />
        </span>
        <span style={{ font: `600 14px/1 ${fonts.mono}`, whiteSpace: "nowrap" }}>
          {points}
          <span style={{ fontWeight: 400, color: colors.inkSoft }}>{` of ${most}`}</span>
        </span>
      </div>
      <div style={{ font: `400 12px/15px ${fonts.text}`, color: colors.inkSoft }}>{words}</div>
    </>
  );
}
