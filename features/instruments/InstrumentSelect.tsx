import { useState } from "react";
import { Pressable, View } from "react-native";
import { Dialog } from "@/features/ui/Dialog";
import { Field } from "@/features/ui/Field";
import { Heading } from "@/features/ui/Heading";
import { Icon } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webProps } from "@/features/ui/webStyle";
import type { OwnInstrument } from "@/shared/contract/instrument";
import { searchInstruments } from "./list/searchInstruments";
import { instrumentWords, offeredInstruments, ownFirst, ownWords, type OfferedInstrument } from "./myInstruments";

export interface InstrumentSelectProps {
  owned: readonly OwnInstrument[];
  value: string;
  onChange: (id: string) => void;
  /** one of the words of a sentence */
  inline?: boolean;
}

/** Which instrument the ways are for; the favourite says so. Opens a list by kind that is searched as one types. */
export function InstrumentSelect({ owned, value, onChange, inline = false }: InstrumentSelectProps) {
  const [open, setOpen] = useState(false);
  const chosen = offeredInstruments(owned).find(({ instrument }) => instrument.id === value);
  const shown = chosen ? ownWords(chosen.instrument, chosen.own) : "";
  return (
    <>
      <View style={inline ? null : { gap: 6 }}>
        {!inline && (
          <Text variant="label" aria-hidden style={{ fontWeight: "600", lineHeight: 18 }}>
            Instrument
          </Text>
        )}
        <Pressable
          role="button"
          onPress={() => setOpen(true)}
          aria-label={`Instrument: ${shown}`}
          testID="instrument"
          {...webProps({ "aria-haspopup": "dialog" })}
          style={
            inline
              ? { borderBottomWidth: 1.5, borderColor: colors.plum }
              : {
                  flexDirection: "row",
                  alignItems: "center",
                  justifyContent: "space-between",
                  gap: 8,
                  minHeight: 52,
                  borderWidth: 1.5,
                  borderColor: colors.inkSoft,
                  borderRadius: 10,
                  backgroundColor: colors.card,
                  paddingVertical: 8,
                  paddingLeft: 14,
                  paddingRight: 12,
                }
          }
        >
          <Text variant={inline ? "strong" : "body"} numberOfLines={1} style={{ flexShrink: 1 }}>
            {shown}
          </Text>
          {!inline && <Icon name="down" size={20} color={colors.inkSoft} />}
        </Pressable>
      </View>
      {open && (
        <Dialog title="Choose an instrument" onClose={() => setOpen(false)} testID="instrument-dialog">
          <Choices
            owned={owned}
            value={value}
            onChoose={(id) => {
              setOpen(false);
              onChange(id);
            }}
          />
        </Dialog>
      )}
    </>
  );
}

interface ChoicesProps {
  owned: readonly OwnInstrument[];
  value: string;
  onChoose: (id: string) => void;
}

function Choices({ owned, value, onChoose }: ChoicesProps) {
  const [typed, setTyped] = useState("");
  const { mine, others } = ownFirst(owned);
  const groups = searchInstruments(mine, others, typed);
  return (
    <View style={{ gap: 12 }}>
      <Field
        label="Find an instrument"
        placeholder="Name or tuning, such as D G B"
        value={typed}
        onChangeText={setTyped}
        inputMode="search"
        testID="find-choice"
      />
      {groups.length === 0 && <Text tone="soft">None is called so or tuned so. Add yours under Instruments.</Text>}
      {groups.map(({ name, instruments }) => (
        <View key={name} role="group" aria-label={name}>
          <Heading level={3} size={14} style={{ color: colors.inkSoft, marginTop: 4 }}>
            {name}
          </Heading>
          {instruments.map((each) => (
            <ChoiceRow key={each.instrument.id} offered={each} on={each.instrument.id === value} onChoose={onChoose} />
          ))}
        </View>
      ))}
    </View>
  );
}

interface ChoiceRowProps {
  offered: OfferedInstrument;
  on: boolean;
  onChoose: (id: string) => void;
}

function ChoiceRow({ offered: { instrument, own }, on, onChoose }: ChoiceRowProps) {
  return (
    <Pressable
      role="button"
      onPress={() => onChoose(instrument.id)}
      testID={`choose-${instrument.id}`}
      {...webProps({ "aria-current": on ? "true" : undefined })}
      style={{
        flexDirection: "row",
        alignItems: "center",
        justifyContent: "space-between",
        gap: 8,
        minHeight: 48,
        borderBottomWidth: 1,
        borderColor: colors.line,
      }}
    >
      <Text style={{ flexShrink: 1, fontWeight: on || own?.favourite ? "600" : "400" }}>
        {instrumentWords(instrument)}
      </Text>
      {on && <Icon name="check" size={20} color={colors.plum} />}
    </Pressable>
  );
}
