import type { Href } from "expo-router";
import { useState } from "react";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { FairestKey } from "./FairestKey";
import type { GroupKey } from "./groupKey";
import { sortedKeys, type GroupOrder, type JudgedSinger } from "./groupKeys";
import { noKeyForAll } from "./groupWords";
import { HeatLegend } from "./HeatCell";
import { HeatTable } from "./HeatTable";

export interface GroupResultProps {
  /** fairest first */
  keys: readonly GroupKey[];
  picked: GroupKey;
  singers: readonly JudgedSinger[];
  coarse: boolean;
  decided: boolean;
  /** to the ways to play the picked key */
  waysHref: Href;
  onPick: (key: GroupKey) => void;
}

/** The fairest key in words, and every singer in every key as a picture with numbers. */
export function GroupResult({ keys, picked, singers, coarse, decided, waysHref, onPick }: GroupResultProps) {
  const [order, setOrder] = useState<GroupOrder>("fairest");
  const orders = [
    { value: "fairest", label: "fairest first" },
    { value: "mean", label: "best average first" },
    ...singers.map(({ id, name }) => ({ value: id, label: `best for ${name} first` })),
  ];
  const known = orders.some(({ value }) => value === order) ? order : "fairest";
  const noKey = noKeyForAll(keys);
  return (
    <View style={{ gap: 14 }}>
      <Heading level={2}>One key for all</Heading>
      <FairestKey picked={picked} fairest={keys[0]!} />
      {decided && (
        <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8, alignItems: "baseline" }}>
          <LiveText variant="small" tone="lagoon" testID="shared-key-kept">
            {`${picked.sign} is kept as the key of this song, whoever sings it.`}
          </LiveText>
          <TextLink href={waysHref}>Ways to play it</TextLink>
        </View>
      )}
      {noKey !== null && (
        <Notice kind="caution" testID="no-key-for-all">
          {noKey}
        </Notice>
      )}
      {coarse && (
        <Text variant="small" tone="soft">
          Coarse: only the lowest and highest note of the tune are known, so every note between counts alike.
        </Text>
      )}
      <Text tone="soft" style={{ lineHeight: 32 }}>
        {"Show the keys "}
        <Select
          inline
          label="Order of the keys"
          value={known}
          options={orders}
          onChange={setOrder}
          testID="group-order"
        />
        {", scores of 100."}
      </Text>
      <HeatTable key={known} keys={sortedKeys(keys, known)} singers={singers} selected={picked} onSelect={onPick} />
      <HeatLegend />
    </View>
  );
}
