import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";

export interface LevelMeterProps {
  /** RMS level in dBFS; -Infinity for silence */
  levelDb: number;
  /** shows "Level" at the left and the words at the right */
  labelled?: boolean;
}

const cells = 24;
const hot = 4;
const floorDb = -60;

/** How many of the 24 cells are lit. */
export function litCells(levelDb: number): number {
  if (!Number.isFinite(levelDb)) return 0;
  return Math.max(0, Math.min(cells, Math.round(((levelDb - floorDb) / -floorDb) * cells)));
}

/** The level in one word. */
export function levelWord(levelDb: number): "Silent" | "Soft" | "Good" | "Loud" | "Too loud" {
  if (!(levelDb > -55)) return "Silent";
  if (levelDb < -42) return "Soft";
  if (levelDb < -12) return "Good";
  return levelDb < -4 ? "Loud" : "Too loud";
}

/** Loudness in 24 cells, the last four rimmed in honey: sing there and the take may be cut off. */
export function LevelMeter({ levelDb, labelled = true }: LevelMeterProps) {
  const lit = litCells(levelDb);
  const word = levelWord(levelDb);
  const row = (
    <View
      role="img"
      aria-label={`Level: ${word}`}
      style={{ flexDirection: "row", gap: 3, flexGrow: 1, flexShrink: 1, maxWidth: 480 }}
    >
      {Array.from({ length: cells }, (_, index) => {
        const on = index < lit;
        const warn = index >= cells - hot;
        return (
          <View
            key={index}
            style={{
              height: 12,
              flexGrow: 1,
              flexBasis: 0,
              borderRadius: 2,
              borderWidth: on ? 0 : warn ? 1.25 : 1,
              borderColor: warn ? colors.honey : mixtures.rungC,
              backgroundColor: on ? (warn ? colors.honey : colors.lagoon) : "transparent",
            }}
          />
        );
      })}
    </View>
  );
  if (!labelled) return row;
  return (
    <View style={{ flexDirection: "row", alignItems: "center", gap: 12 }}>
      <Text variant="small" tone="soft" style={{ width: 44 }}>
        Level
      </Text>
      {row}
      <Text variant="small" style={{ fontWeight: "600", width: 64, textAlign: "right" }} aria-hidden>
        {word}
      </Text>
    </View>
  );
}
