import { useRef, useState } from "react";
import { View } from "react-native";
import { IconButton } from "@/features/ui/IconButton";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { colors } from "@/features/ui/theme";
import { SingerForm, type ReadNotes } from "./SingerForm";
import { freeName, type KnownSinger, type Singer } from "./singers";

export interface SingersListProps {
  singers: readonly Singer[];
  /** the same, in the same order */
  known: readonly KnownSinger[];
  readNotes: ReadNotes;
  onChange: (singers: Singer[], said: string) => void;
}

/** Who sings: name, where the notes come from, and how to change or leave out each. */
export function SingersList({ singers, known, readNotes, onChange }: SingersListProps) {
  const [edited, setEdited] = useState<string | null>(null);
  const rows = useRef(new Map<string, View>());
  const close = (id: string) => {
    setEdited(null);
    (rows.current.get(id) as unknown as HTMLElement | undefined)?.querySelector<HTMLElement>("[role=button]")?.focus();
  };
  return (
    <View role="list" testID="singers">
      {singers.map((singer, at) => {
        const shown = known[at]!;
        const others = known.filter(({ id }) => id !== singer.id).map(({ name }) => name);
        return (
          <View
            key={singer.id}
            ref={(row) => {
              if (row) rows.current.set(singer.id, row);
              else rows.current.delete(singer.id);
            }}
            role="listitem"
            testID="singer"
            style={{ borderTopWidth: at === 0 ? 0 : 1, borderColor: colors.line, paddingVertical: 4 }}
          >
            <View style={{ flexDirection: "row", alignItems: "center" }}>
              <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
                <Text variant="strong" style={{ lineHeight: 20 }}>
                  {shown.name}
                </Text>
                <Text variant="small" tone={shown.lacks ? "honey" : "soft"}>
                  {shown.origin}
                </Text>
                {shown.lacks === "notes" && <TextLink href="/voice/sing">Sing a few seconds</TextLink>}
              </View>
              <IconButton
                icon="edit"
                label={`Change ${shown.name}`}
                onPress={() => setEdited(edited === singer.id ? null : singer.id)}
              />
              <IconButton
                icon="close"
                label={`Leave out ${shown.name}`}
                onPress={() =>
                  onChange(
                    singers.filter(({ id }) => id !== singer.id),
                    `${shown.name} left out`,
                  )
                }
              />
            </View>
            {edited === singer.id && (
              <View style={{ paddingVertical: 8 }}>
                <SingerForm
                  label={`Change ${shown.name}`}
                  start={{ name: shown.name, notes: singer.kind === "hand" ? singer.notes : null }}
                  withNotes={singer.kind === "hand"}
                  readNotes={readNotes}
                  button="Keep"
                  onCancel={() => close(singer.id)}
                  onKeep={(name, notes) => {
                    const called = freeName(name, others);
                    const changed: Singer =
                      singer.kind === "hand"
                        ? { ...singer, name: called, notes: notes ?? singer.notes }
                        : { ...singer, name: called };
                    onChange(
                      singers.map((each) => (each === singer ? changed : each)),
                      `${called} changed`,
                    );
                    close(singer.id);
                  }}
                />
              </View>
            )}
          </View>
        );
      })}
    </View>
  );
}
