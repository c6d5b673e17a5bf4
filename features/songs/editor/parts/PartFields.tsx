import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { IconButton } from "@/features/ui/IconButton";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import type { ChartPart } from "@/shared/songs/chartParts";
import { freeName, kindWords, partKinds, type NamedKind } from "./partKinds";

export interface PartFieldsProps {
  part: ChartPart;
  names: readonly (string | null)[];
  /** false where the name could not be read as one */
  onRename: (name: string, times: number) => boolean;
  onCopy: () => void;
  onRemove: () => void;
}

/** What a part is, how it is called and how often it comes. */
export function PartFields({ part, names, onRename, onCopy, onRemove }: PartFieldsProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const [refused, setRefused] = useState(false);
  const rename = (name: string, times: number) => {
    const done = onRename(name, times);
    setRefused(!done);
    if (done) setTyped(null);
  };
  const name = part.name ?? "";
  const kind = partKinds.find((each) => each === part.kind) ?? "own";
  const keepTyped = () => {
    if (typed !== null && typed.trim() !== name) rename(typed, part.times);
  };
  return (
    <View style={{ gap: 12, paddingTop: 4, paddingBottom: 12 }}>
      <Select<NamedKind | "own">
        label="Kind"
        testID="part-kind"
        value={kind}
        options={[
          ...partKinds.map((value) => ({ value, label: kindWords[value] })),
          { value: "own" as const, label: "A name of its own" },
        ]}
        onChange={(to) => {
          if (to === "own") setTyped(name);
          else if (to !== kind) rename(freeName(to, names), part.times);
        }}
      />
      <Field
        label="Name"
        value={typed ?? name}
        onChangeText={(text) => {
          setRefused(false);
          setTyped(text);
        }}
        onBlur={keepTyped}
        error={refused ? "This would not be read as the name of a part. Choose another." : undefined}
        testID="part-name"
      />
      <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 4 }}>
        <IconButton
          icon="minus"
          label="Once less"
          disabled={part.name === null || part.times <= 1}
          onPress={() => rename(name, part.times - 1)}
        />
        <Text variant="label" testID="part-times" style={{ minWidth: 72, textAlign: "center" }}>
          {part.times === 1 ? "Once" : part.times === 2 ? "Twice" : `${part.times} times`}
        </Text>
        <IconButton
          icon="plus"
          label="Once more"
          disabled={part.name === null || part.times >= 99}
          onPress={() => rename(name, part.times + 1)}
          testID="once-more"
        />
        {part.name !== null && <Button kind="text" small label="Copy" onPress={onCopy} testID="copy-part" />}
        <Button kind="text" small icon="trash" label="Take out" onPress={onRemove} testID="remove-part" />
      </View>
    </View>
  );
}
