import { Link } from "expo-router";
import { memo, type CSSProperties } from "react";
import { KeySign } from "@/features/ui/KeySign";
import { Text } from "@/features/ui/Text";
import { BlankCell } from "@/features/ui/table/BlankCell";
import { cell } from "@/features/ui/table/tableStyles";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { webStyle } from "@/features/ui/webStyle";
import type { SongListing } from "@/shared/contract/songListing";
import { RowChoice, RowMenuButton } from "./RowTools";
import { playedWords, shownKey, spanWords, sungSpan } from "./shelfRow";
import { shelfScale } from "./shelfScale";
import type { SongRowsProps } from "./SongRows";
import { SpanBar } from "@/features/span/SpanBar";

export interface SongCellsProps extends Pick<SongRowsProps, "voice" | "mineOf" | "fitOf" | "actions"> {
  song: SongListing;
  /** of the span's picture, px */
  width: number;
  /** tags have a column of their own */
  roomy: boolean;
}

/** What stands in a song's row of the table. Drawn once, however often the table is scrolled. */
export const SongCells = memo(function SongCells({
  song,
  voice,
  mineOf,
  fitOf,
  actions,
  width,
  roomy,
}: SongCellsProps) {
  const mine = mineOf(song);
  const sung = voice && sungSpan(song, mine, voice);
  const fit = fitOf?.(song) ?? null;
  const written = shownKey(song, null);
  const tags = song.tags.length > 0 && (
    <Text variant="tiny" tone="plum" style={webStyle({ display: "block" })}>
      {song.tags.join(" · ")}
    </Text>
  );
  return (
    <>
      {actions.chosen !== null && (
        <td style={{ ...td, padding: 0 }}>
          <RowChoice song={song} actions={actions} />
        </td>
      )}
      <th scope="row" style={{ ...td, textAlign: "left", fontWeight: 400 }}>
        <Link
          href={{ pathname: "/songs/[id]", params: { id: song.id } }}
          testID={`song-${song.id}`}
          style={webStyle({
            display: "flex",
            flexDirection: "column",
            justifyContent: "center",
            padding: "6px 0",
            minHeight: 48,
            boxSizing: "border-box",
          })}
        >
          <Text variant="strong">{song.title}</Text>
          {!roomy && tags}
          {song.demo !== null && !mine && (
            <Text variant="tiny" tone="soft">
              a song to try Larkspan with
            </Text>
          )}
        </Link>
      </th>
      <td style={td}>{written ? <KeySign of={written} size={20} tone="soft" /> : <BlankCell words="no key yet" />}</td>
      <td style={td} title={mine?.words}>
        {mine ? (
          <>
            <KeySign of={mine.key} size={20} tone={mine.elsewhere ? "soft" : "ink"} />
            <span style={unseen}>{`. ${mine.words}`}</span>
          </>
        ) : (
          <BlankCell words="not decided" />
        )}
      </td>
      {voice && (
        <>
          <td style={td}>
            {sung ? (
              <SpanBar
                voice={voice}
                span={sung}
                scale={shelfScale(voice)}
                width={width}
                words={spanWords(sung, shownKey(song, mine))}
              />
            ) : (
              <Text variant="tiny" tone="soft">
                no melody yet
              </Text>
            )}
          </td>
          <td data-testid="fit" style={{ ...td, font: `600 16px/20px ${fonts.display}` }}>
            {fit ?? <BlankCell words="not known" />}
          </td>
        </>
      )}
      {roomy && <td style={td}>{tags}</td>}
      <td style={{ ...td, color: colors.inkSoft }}>{playedWords(song.playedAt, new Date())}</td>
      <td style={{ ...td, padding: 0 }}>
        <RowMenuButton song={song} actions={actions} />
      </td>
    </>
  );
});

const td: CSSProperties = { ...cell, height: 59 };
