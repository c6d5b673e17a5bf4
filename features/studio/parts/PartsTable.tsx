import { Link } from "expo-router";
import type { CSSProperties } from "react";
import { View, type TextStyle } from "react-native";
import { setSigns } from "@/features/ui/textSigns";
import { Text } from "@/features/ui/Text";
import { cell, head, table } from "@/features/ui/table/tableStyles";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import type { PartRow } from "@/shared/contract/studio/assignment";
import { glyphs } from "@/shared/music/pitch";
import { dayOf } from "../dayWords";
import { partPath, stateTone, stateWords } from "../partWords";
import { EffortBars } from "../roster/EffortBars";
import { playedWords } from "./playedWords";

const rank = { "handed-in": 0, returned: 1, assigned: 2, accepted: 3 } as const;

/** The parts of an assignment: takes to hear first. */
export function PartsTable({ parts, now }: { parts: readonly PartRow[]; now: Date }) {
  const wide = useLayout() === "wide";
  const shown = [...parts].sort((a, b) => rank[a.state] - rank[b.state] || a.pupil.localeCompare(b.pupil, "en"));
  if (!wide)
    return (
      <View role="list" testID="assignment-parts">
        {shown.map((part) => (
          <View key={part.id} role="listitem" style={{ borderTopWidth: 1, borderColor: colors.line }}>
            <Line part={part} now={now} />
          </View>
        ))}
      </View>
    );
  return (
    <table style={{ ...table, tableLayout: "auto" }} data-testid="assignment-parts">
      <caption style={unseen}>Each pupil with key, way, state and last take</caption>
      <thead>
        <tr>
          {["Pupil", "Key", "Way", "State", "Last take, and how it felt"].map((label) => (
            <th key={label} scope="col" style={head}>
              {label}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {shown.map((part) => (
          <tr key={part.id}>
            <th scope="row" style={{ ...td, textAlign: "left", fontWeight: 600 }}>
              <Link href={partPath(part.id)} testID={`part-${part.id}`} style={webStyle(cellLink)}>
                {part.pupil}
              </Link>
            </th>
            <td style={{ ...td, font: `700 18px/20px ${fonts.display}` }}>{setSigns(glyphs(part.tonic))}</td>
            <td style={td}>{part.shares ? setSigns(playedWords(part)) : ""}</td>
            <td style={{ ...td, fontWeight: 500, color: toneColor[stateTone[part.state]] }}>
              {part.shares ? stateWords.teacher[part.state] : "has not agreed to show this"}
            </td>
            <td style={td}>
              {part.lastTake && (
                <span style={{ display: "flex", gap: 10, alignItems: "center" }}>
                  <EffortBars effort={part.lastTake.effort} />
                  {dayOf(part.lastTake.at, now)}
                </span>
              )}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Line({ part, now }: { part: PartRow; now: Date }) {
  return (
    <Link
      href={partPath(part.id)}
      testID={`part-${part.id}`}
      style={[
        { flexDirection: "row", alignItems: "center", gap: 12, minHeight: 64, paddingVertical: 8 } as TextStyle,
        webStyle({ display: "flex", color: colors.ink }),
      ]}
    >
      <span style={{ font: `700 20px/24px ${fonts.display}`, width: 36, flexShrink: 0 }}>
        {setSigns(glyphs(part.tonic))}
      </span>
      <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
        <Text variant="strong">{part.pupil}</Text>
        <Text variant="small" tone={part.shares ? stateTone[part.state] : "soft"}>
          {part.shares ? stateWords.teacher[part.state] : "has not agreed to show this"}
        </Text>
      </View>
      {part.lastTake && (
        <View style={{ alignItems: "flex-end", gap: 4 }}>
          <EffortBars effort={part.lastTake.effort} />
          <Text variant="tiny" tone="soft">
            {dayOf(part.lastTake.at, now)}
          </Text>
        </View>
      )}
    </Link>
  );
}

const toneColor = { soft: colors.inkSoft, plum: colors.plum, honey: colors.honeyText, lagoon: colors.lagoon } as const;
const cellLink: CSSProperties = {
  display: "flex",
  alignItems: "center",
  minHeight: 48,
  font: `600 15px/18px ${fonts.text}`,
  color: colors.ink,
};
const td: CSSProperties = { ...cell, height: 48 };
