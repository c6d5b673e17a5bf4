import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { View } from "react-native";
import { newId } from "@/features/api/newId";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { Heading } from "@/features/ui/Heading";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import type { OwnInstrument } from "@/shared/contract/instrument";
import { instrumentQueries, useSaveInstruments } from "../instrumentQueries";
import { makeFavourite, ownFirst, turnHand } from "../myInstruments";
import { InstrumentCard } from "./InstrumentCard";
import { searchInstruments, type InstrumentGroup } from "./searchInstruments";

/** Every instrument that ways can be found for: one's own, and the presets by kind; which is played first, by which hand. */
export function InstrumentList() {
  const query = useQuery(instrumentQueries.all());
  return (
    <QueryState query={query} title="Your instruments could not be opened">
      {(owned) => <Instruments owned={owned} />}
    </QueryState>
  );
}

function Instruments({ owned }: { owned: readonly OwnInstrument[] }) {
  const save = useSaveInstruments();
  const [typed, setTyped] = useState("");
  const [open, setOpen] = useState<readonly string[]>(["Yours"]);
  const phone = useLayout() === "phone";
  const { mine, others } = ownFirst(owned);
  const groups = searchInstruments(mine, others, typed);
  const favourite = mine.find(({ own }) => own?.favourite === true);
  const hits = groups.reduce((sum, { instruments }) => sum + instruments.length, 0);
  return (
    <View style={{ gap: 20 }}>
      <Text tone="soft">
        {favourite
          ? `Ways are found for ${favourite.instrument.name} first. You can choose another one at every song.`
          : "Mark the one you play most. Ways are found for it first; you can choose another one at every song."}
      </Text>
      {save.error && <Notice kind="error">{`${save.error.message} Your instruments are as they were.`}</Notice>}
      <View style={{ maxWidth: 480 }}>
        <Field
          label="Find an instrument"
          placeholder="Name or tuning, such as D G B"
          value={typed}
          onChangeText={setTyped}
          inputMode="search"
          testID="find-instrument"
        />
        <LiveText variant="tiny" tone="soft" hidden={typed.trim() === ""}>
          {typed.trim() === "" ? "" : hits === 1 ? "1 instrument found" : `${hits} instruments found`}
        </LiveText>
      </View>
      {groups.length === 0 && (
        <Text>No preset is called so or tuned so. Add yours as a new instrument; it takes a minute.</Text>
      )}
      {groups.map((group) => (
        <Group
          key={group.name}
          group={group}
          // On the phone the kinds stay shut, so that the list is one screen long; a search opens what it finds.
          shut={phone && typed.trim() === "" && !open.includes(group.name)}
          onToggle={
            phone && typed.trim() === ""
              ? () =>
                  setOpen(
                    open.includes(group.name) ? open.filter((name) => name !== group.name) : [...open, group.name],
                  )
              : null
          }
        >
          {group.instruments.map((each) => (
            <InstrumentCard
              key={each.instrument.id}
              offered={each}
              busy={save.isPending}
              onFavourite={() => save.mutate(makeFavourite(owned, each.instrument.id, newId))}
              onHand={(left) => save.mutate([turnHand(owned, each.instrument.id, left, newId)])}
            />
          ))}
        </Group>
      ))}
    </View>
  );
}

interface GroupProps {
  group: InstrumentGroup;
  shut: boolean;
  onToggle: (() => void) | null;
  children: React.ReactNode;
}

function Group({ group: { name, instruments }, shut, onToggle, children }: GroupProps) {
  const columns = { phone: 1, middle: 2, wide: 3 }[useLayout()];
  return (
    <View style={{ gap: 10 }}>
      <View style={{ flexDirection: "row", alignItems: "center", justifyContent: "space-between", gap: 12 }}>
        <Heading level={2}>{name}</Heading>
        {onToggle && (
          <Button
            kind="text"
            small
            icon={shut ? "down" : "up"}
            label={shut ? `Show ${instruments.length}` : "Hide"}
            accessibleName={`${shut ? `Show ${instruments.length}` : "Hide"}: ${name}`}
            expanded={!shut}
            onPress={onToggle}
            testID={`group-${name}`}
          />
        )}
      </View>
      {!shut && (
        <View
          role="list"
          aria-label={name}
          style={webStyle({ display: "grid", gridTemplateColumns: `repeat(${columns}, minmax(0, 1fr))`, gap: 12 })}
        >
          {children}
        </View>
      )}
    </View>
  );
}
