import { useDeferredValue, useMemo, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { IconButton } from "@/features/ui/IconButton";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { addPart, chartParts, copyPart, movePart, removePart, renamePart } from "@/shared/songs/chartParts";
import { PartFields } from "./PartFields";
import { freeName, kindWords, partKinds, type NamedKind } from "./partKinds";

export interface PartListProps {
  text: string;
  onText: (text: string) => void;
  /** takes the caret to a row, counted from 0 */
  onShow: (row: number) => void;
  level?: 2 | 3;
}

/** So many parts are listed; more are asked for. */
const atOnce = 60;

/** The parts of the song in order: to name, to repeat, to move, to copy, to take out and to add. */
export function PartList({ text, onText, onShow, level = 2 }: PartListProps) {
  const read = useDeferredValue(text);
  const parts = useMemo(() => chartParts(read), [read]);
  const [most, setMost] = useState(atOnce);
  // What stands before the first heading stays first.
  const first = parts[0]?.name === null ? 1 : 0;
  const [open, setOpen] = useState<number | null>(null);
  const [adding, setAdding] = useState<NamedKind>("verse");
  const put = (now: string | null) => {
    if (now !== null) onText(now);
    return now !== null;
  };
  const move = (from: number, to: number) => {
    if (put(movePart(text, from, to))) setOpen(open === from ? to : open === to ? from : open);
  };
  return (
    <View testID="parts" style={{ gap: 10 }}>
      <Heading level={level} size={16}>
        Parts
      </Heading>
      {parts.length === 0 && (
        <Text variant="small" tone="soft">
          The song has no parts yet. Add one, or write its name on a line of its own in the chart.
        </Text>
      )}
      <View role="list" style={{ borderTopWidth: parts.length > 0 ? 1 : 0, borderColor: colors.line }}>
        {parts.slice(0, most).map((part, index) => {
          const name = part.name ?? "Before the first part";
          return (
            <View
              role="listitem"
              key={index}
              testID={`part-${index}`}
              style={{ borderBottomWidth: 1, borderColor: colors.line, paddingVertical: 2 }}
            >
              <View style={{ flexDirection: "row", alignItems: "center" }}>
                <Button
                  kind="text"
                  label={part.times > 1 ? `${name} ×${part.times}` : name}
                  accessibleName={`${part.times > 1 ? `${name} ×${part.times}` : name}: change`}
                  expanded={open === index}
                  onPress={() => {
                    setOpen(open === index ? null : index);
                    onShow(part.start);
                  }}
                  style={{ flexGrow: 1, flexShrink: 1, justifyContent: "flex-start", paddingHorizontal: 0 }}
                  testID={`part-name-${index}`}
                />
                {part.name !== null && (
                  <>
                    <IconButton
                      icon="up"
                      label={`Move ${name} up`}
                      disabled={index <= first}
                      onPress={() => move(index, index - 1)}
                    />
                    <IconButton
                      icon="down"
                      label={`Move ${name} down`}
                      disabled={index === parts.length - 1}
                      onPress={() => move(index, index + 1)}
                    />
                  </>
                )}
              </View>
              {open === index && (
                <PartFields
                  key={index}
                  part={part}
                  onRename={(to, times) => put(renamePart(text, index, to, times))}
                  onCopy={() => put(copyPart(text, index))}
                  onRemove={() => {
                    put(removePart(text, index));
                    setOpen(null);
                  }}
                  names={parts.map((each) => each.name)}
                />
              )}
            </View>
          );
        })}
      </View>
      {parts.length > most && (
        <Button
          kind="text"
          small
          label={`Show more of the ${parts.length} parts`}
          onPress={() => setMost(most + atOnce)}
          testID="more-parts"
        />
      )}
      <View style={{ flexDirection: "row", gap: 8, alignItems: "flex-end" }}>
        <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
          <Select<NamedKind>
            label="Another part"
            testID="add-part-kind"
            value={adding}
            options={partKinds.map((kind) => ({ value: kind, label: kindWords[kind] }))}
            onChange={setAdding}
          />
        </View>
        <Button
          kind="secondary"
          small
          label="Add"
          accessibleName={`Add ${kindWords[adding].toLowerCase()}`}
          onPress={() => {
            const named = freeName(
              adding,
              parts.map((part) => part.name),
            );
            if (!put(addPart(text, named))) return;
            setMost(Math.max(most, parts.length + 1));
            setOpen(parts.length);
          }}
          testID="add-part"
        />
      </View>
    </View>
  );
}
