import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { Song } from "@/shared/contract/song";
import type { KeyRow } from "../../keyRows";
import { effortWords } from "@/shared/voice/effortWords";
import type { KnownTry } from "../tryQueries";
import { measureWords, wholeMeasures } from "../report/measureWords";
import { spellingIn } from "../../keyRows";
import { sameKey } from "../../sameKey";
import type { RankMove } from "./rankMoves";

export interface SideBySideProps {
  song: Song;
  tries: readonly KnownTry[];
  /** all keys without any try, and as they stand */
  moves: readonly RankMove[];
  /** the shift of the decided key */
  decided: number | null;
  saving: boolean;
  onDecide: (row: KeyRow) => void;
}

const cell = { verticalAlign: "top", padding: "8px 14px 8px 0", borderTop: "1px solid var(--line)" } as const;
const headCell = { ...cell, textAlign: "left", fontWeight: 400, width: 108 } as const;

/** The keys tried in this sitting, a column each: what was measured, how it felt, and what that did to the score. */
export function SideBySide({ song, tries, moves, decided, saving, onDecide }: SideBySideProps) {
  const columns = tries.flatMap((tried) => {
    // The tries may have moved the key to a better octave; it is the same key still.
    const move = moves.find(({ row }) => sameKey(row.shift, tried.shift));
    return move
      ? [
          {
            tried,
            move,
            words: tried.measures && measureWords(wholeMeasures(tried.measures), spellingIn(move.row.key)),
          },
        ]
      : [];
  });
  if (columns.length === 0) return null;
  const names = columns.find(({ words }) => words)?.words?.map(({ name }) => name) ?? [];
  return (
    <View role="region" aria-label="Keys tried in this sitting" style={{ gap: 10 }} testID="side-by-side">
      <Heading level={2}>
        {columns.length > 1 ? "Tried in this sitting, side by side" : "Tried in this sitting"}
      </Heading>
      {/* Its columns stay readable on a small phone: the table scrolls by itself. */}
      <div style={{ overflowX: "auto" }} tabIndex={0} role="group" aria-label="Table of the tried keys">
        <table style={{ borderCollapse: "collapse", minWidth: 108 + 132 * columns.length, color: colors.ink }}>
          <thead>
            <tr>
              <th scope="col" style={{ ...headCell, borderTop: "none" }}>
                <Text variant="small" tone="soft">
                  Key
                </Text>
              </th>
              {columns.map(({ tried, move }) => (
                <th key={tried.id} scope="col" style={{ ...cell, borderTop: "none", textAlign: "left" }}>
                  <Text variant="title">{move.row.sign}</Text>
                  {tried.waiting && (
                    <Text variant="tiny" tone="soft">
                      on this device
                    </Text>
                  )}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            <Line name="Felt">
              {columns.map(({ tried }) => ({
                key: tried.id,
                text: tried.effort === null ? "not said" : `${tried.effort} of 5, ${effortWords[tried.effort - 1]}`,
                tone: tried.effort !== null && tried.effort >= 4 ? ("brick" as const) : ("ink" as const),
              }))}
            </Line>
            {names.map((name, k) => (
              <Line key={name} name={name}>
                {columns.map(({ tried, words }) => ({
                  key: tried.id,
                  text: words?.[k]?.text ?? "not to be told",
                  tone: words?.[k]?.tone ?? ("soft" as const),
                }))}
              </Line>
            ))}
            <Line name="Score">
              {columns.map(({ tried, move }) => ({
                key: tried.id,
                text:
                  move.scoreBefore === move.row.score
                    ? `${move.row.score}, as before`
                    : `${move.row.score}, was ${move.scoreBefore}`,
                tone: "ink" as const,
              }))}
            </Line>
            <tr>
              <th scope="row" style={headCell}>
                <Text variant="small" tone="soft">
                  Your key
                </Text>
              </th>
              {columns.map(({ tried, move: { row } }) => (
                <td key={tried.id} style={cell}>
                  {decided !== null && sameKey(decided, row.shift) ? (
                    <Text variant="small" tone="lagoon" style={{ fontWeight: "600" }}>
                      {`${row.sign} is my key`}
                    </Text>
                  ) : (
                    <Button
                      kind="secondary"
                      small
                      label={`Take ${row.sign}`}
                      accessibleName={`Take ${row.sign} as my key`}
                      busy={saving}
                      onPress={() => onDecide(row)}
                      testID={`take-${row.key.tonic}`}
                    />
                  )}
                </td>
              ))}
            </tr>
          </tbody>
        </table>
      </div>
      <LinkButton
        kind="text"
        small
        href={{ pathname: "/songs/[id]/keys", params: { id: song.id } }}
        label="All twelve keys"
        style={{ alignSelf: "flex-start" }}
      />
    </View>
  );
}

interface LineProps {
  name: string;
  children: { key: string; text: string; tone: "ink" | "soft" | "honey" | "brick" }[];
}

function Line({ name, children }: LineProps) {
  return (
    <tr>
      <th scope="row" style={headCell}>
        <Text variant="small" tone="soft">
          {name}
        </Text>
      </th>
      {children.map(({ key, text, tone }) => (
        <td key={key} style={cell}>
          <Text variant="small" tone={tone} style={{ fontWeight: tone === "ink" || tone === "soft" ? "400" : "600" }}>
            {text}
          </Text>
        </td>
      ))}
    </tr>
  );
}
