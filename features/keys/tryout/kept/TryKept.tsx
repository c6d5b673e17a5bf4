import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import type { Crumb } from "@/features/ui/ScreenHead";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { KeyRow } from "../../keyRows";
import { sameKey } from "../../sameKey";
import { ComfortChange } from "./ComfortChange";
import { rankMoves } from "./rankMoves";
import { RankNow } from "./RankNow";
import { Sitting } from "./Sitting";
import { rowsWith, triesOfVoice } from "./triedRows";
import { tryQueries, useRemoveTry } from "../tryQueries";
import type { TryScreenProps } from "../tryScreenProps";

export interface TryKeptProps extends TryScreenProps {
  sign: string;
  keptId: string;
  crumb: Crumb;
  /** on to another try */
  onOn: () => void;
}

const nextKeys = 3;

/** After a try is kept: what moved and why, what was tried in this sitting, and the next key. */
export function TryKept(props: TryKeptProps) {
  const { song, sign, keptId, crumb, onOn, onKey, singer, voice } = props;
  const wide = useLayout() === "wide";
  const remove = useRemoveTry();
  const tries = useQuery(tryQueries.all());
  const own = triesOfVoice(tries.data ?? [], singer?.id ?? null);
  const kept = own.find(({ id }) => id === keptId) ?? null;
  const others = own.filter(({ id }) => id !== keptId);
  const before = rowsWith(song, voice, others);
  const now = rowsWith(song, voice, own);
  const tried = own.filter(({ songId }) => songId === song.id);
  const next = (now?.rows ?? [])
    .filter((row) => !row.beyond && !tried.some(({ shift }) => sameKey(shift, row.shift)))
    .slice(0, nextKeys);
  const [first] = next;
  const goTo = (row: KeyRow) => {
    onKey({ tonic: row.key.tonic, shift: row.shift });
    onOn();
  };
  return (
    <Screen
      title={`${sign} is tried`}
      subtitle={song.title}
      crumb={crumb}
      wide
      footer={
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
          <Button kind="secondary" icon="again" label={`${sign} again`} onPress={onOn} testID="try-on" />
          {first && (
            <Button
              icon="mic"
              label={`Try ${first.sign} next`}
              onPress={() => goTo(first)}
              style={{ flexGrow: 1 }}
              testID="try-next"
            />
          )}
        </View>
      }
    >
      <View style={{ gap: 20 }}>
        {remove.error && (
          <Notice kind="error" title="It is still counted">{`${remove.error.message} Try again.`}</Notice>
        )}
        {!kept ? (
          <Notice kind="good" testID="try-undone">
            The try is taken out. Keys and comfort band are as they were without it.
          </Notice>
        ) : before && now ? (
          <View style={{ flexDirection: wide ? "row" : "column", gap: wide ? 48 : 20 }}>
            <View style={wide ? { flexGrow: 1, flexBasis: 0 } : null}>
              <RankNow
                moves={rankMoves(before.rows, now.rows)}
                shift={kept.shift}
                sign={sign}
                why={now.why.filter((sentence) => !before.why.includes(sentence))}
                waiting={kept.waiting}
                undoing={remove.isPending}
                onUndo={() => remove.mutate(kept)}
              />
            </View>
            <View style={wide ? { width: 440 } : null}>
              <ComfortChange before={before.comfort} now={now.comfort} />
            </View>
          </View>
        ) : (
          <Notice kind="good" testID="try-kept">
            {`Kept${kept.waiting ? " on this device until the connection is back" : ""}. With a voice and a tune the keys would be ranked by it.`}
          </Notice>
        )}
        {next.length > 0 && (
          <View style={{ gap: 8 }}>
            <Heading level={2}>Try another key now</Heading>
            <Text variant="small" tone="soft">
              Two or three keys sung after each other are told apart best. Rest in between.
            </Text>
            <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
              {next.map((row) => (
                <Button
                  key={row.shift}
                  kind="secondary"
                  small
                  label={`${row.sign}, ${row.score}`}
                  accessibleName={`${row.sign}, ${row.score}: try it`}
                  onPress={() => goTo(row)}
                  testID={`try-next-${row.key.tonic}`}
                />
              ))}
            </View>
          </View>
        )}
        <Sitting {...props} />
      </View>
    </Screen>
  );
}
