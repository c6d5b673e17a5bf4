import type { ReactNode } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { PinLine } from "../compare/PinBar";
import type { Pinning } from "../compare/pins";
import type { KeyRow } from "../keyRows";
import { accidentalChoices, isFiltering, noFilter, remainingWords, type KeyFilter } from "./keyFilter";
import { orderChoices, orderOf, orderValue, type KeyOrder } from "./keyOrder";

export interface KeySentenceProps {
  rows: readonly KeyRow[];
  filter: KeyFilter;
  onFilter: (filter: KeyFilter) => void;
  order: KeyOrder;
  onOrder: (order: KeyOrder) => void;
  /** the list of instruments; null where the song has no chords to play */
  chooser: ReactNode | null;
  /** how many keys remain, and how many of these still wait for their ways */
  left: number;
  searching: number;
  pinning: Pinning;
}

/** What the table shows, as a sentence whose underlined words can be changed, and how many keys remain of it. */
export function KeySentence({
  rows,
  filter,
  onFilter,
  order,
  onOrder,
  chooser,
  left,
  searching,
  pinning,
}: KeySentenceProps) {
  const words = remainingWords(left, rows.length, searching, filter);
  return (
    <View style={{ marginBottom: 10 }}>
      <View style={{ flexDirection: "row", flexWrap: "wrap", justifyContent: "space-between", columnGap: 16 }}>
        <Text tone="soft" style={{ lineHeight: 32, flexShrink: 1 }}>
          {"Show "}
          <Select
            inline
            label="Which keys"
            value={filter.accidentals === null ? "any" : String(filter.accidentals)}
            options={accidentalChoices(rows)}
            onChange={(value) => onFilter({ ...filter, accidentals: value === "any" ? null : Number(value) })}
            testID="filter-accidentals"
          />
          {", "}
          <Select
            inline
            label="Order of the keys"
            value={orderValue(order)}
            options={orderChoices(order, chooser !== null)}
            onChange={(value) => onOrder(orderOf(value))}
            testID="key-order"
          />
          {chooser === null ? (
            ". The song has no chords yet, so no ways to play it are shown."
          ) : (
            <>
              {", played on "}
              {chooser}
              {", with "}
              <Select
                inline
                label="Capo"
                value={filter.noCapo ? "none" : "any"}
                options={[
                  { value: "any", label: "any capo" },
                  { value: "none", label: "no capo" },
                ]}
                onChange={(value) => onFilter({ ...filter, noCapo: value === "none" })}
                testID="filter-capo"
              />
              {" and "}
              <Select
                inline
                label="Barres"
                value={filter.noBarre ? "none" : "any"}
                options={[
                  { value: "any", label: "any shapes" },
                  { value: "none", label: "no barre" },
                ]}
                onChange={(value) => onFilter({ ...filter, noBarre: value === "none" })}
                testID="filter-barre"
              />
              .
            </>
          )}
        </Text>
        <PinLine pinning={pinning} />
      </View>
      <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 8 }}>
        <LiveText variant="small" testID="keys-left">
          {words ?? ""}
        </LiveText>
        {isFiltering(filter) && (
          <Button
            kind="text"
            small
            label="Show all twelve keys"
            onPress={() => onFilter(noFilter)}
            testID="clear-filter"
            style={{ marginVertical: -8 }}
          />
        )}
      </View>
    </View>
  );
}
