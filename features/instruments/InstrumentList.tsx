import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { newId } from "@/features/api/newId";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Chip } from "@/features/ui/Chip";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { tunePath } from "@/features/ui/tunePath";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import { instrumentQueries, useSaveInstruments } from "./instrumentQueries";
import { makeFavourite, offeredInstruments, stringWords, turnHand, type OfferedInstrument } from "./myInstruments";

/** Every instrument that ways can be found for; which one is played first, and by which hand. */
export function InstrumentList() {
  const query = useQuery(instrumentQueries.all());
  const save = useSaveInstruments();
  const columns = { phone: 1, middle: 2, wide: 3 }[useLayout()];
  return (
    <QueryState query={query} title="Your instruments could not be opened">
      {(owned) => {
        const offered = offeredInstruments(owned);
        const favourite = offered.find(({ own }) => own?.favourite === true);
        return (
          <View style={{ gap: 16 }}>
            <Text tone="soft">
              {favourite
                ? `Ways are found for ${favourite.instrument.name} first. You can choose another one at every song.`
                : "Mark the one you play most. Ways are found for it first; you can choose another one at every song."}
            </Text>
            {save.error && <Notice kind="error">{`${save.error.message} Your instruments are as they were.`}</Notice>}
            <View
              role="list"
              style={webStyle({ display: "grid", gridTemplateColumns: `repeat(${columns}, minmax(0, 1fr))`, gap: 12 })}
            >
              {offered.map((each) => (
                <InstrumentCard
                  key={each.instrument.id}
                  offered={each}
                  busy={save.isPending}
                  onFavourite={() => save.mutate(makeFavourite(owned, each.instrument.id, newId))}
                  onHand={(left) => save.mutate([turnHand(owned, each.instrument.id, left, newId)])}
                />
              ))}
            </View>
          </View>
        );
      }}
    </QueryState>
  );
}

interface InstrumentCardProps {
  offered: OfferedInstrument;
  busy: boolean;
  onFavourite: () => void;
  onHand: (leftHanded: boolean) => void;
}

function InstrumentCard({ offered: { instrument, own }, busy, onFavourite, onHand }: InstrumentCardProps) {
  const mine = own?.favourite === true;
  return (
    <View role="listitem" testID={`instrument-${instrument.id}`} style={webStyle({ display: "flex" })}>
      <Card selected={mine} style={{ flexGrow: 1, flexShrink: 1, gap: 4, minWidth: 0 }}>
        <Heading level={2} size={16}>
          {instrument.name}
        </Heading>
        <Text variant="mono" style={{ fontSize: 14 }}>
          {stringWords(instrument, true)}
        </Text>
        <Text variant="small" tone="soft">
          {`${instrument.strings.length} strings, ${Math.round(instrument.scaleMm)} mm, ${instrument.frets} frets`}
        </Text>
        <View
          style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 12, alignItems: "center", marginTop: "auto" }}
        >
          {mine ? (
            <Chip label="I play this" selected />
          ) : (
            <Button
              kind="text"
              small
              label="I play this"
              accessibleName={`I play this: ${instrument.name}`}
              disabled={busy}
              onPress={onFavourite}
              style={{ marginLeft: -8 }}
            />
          )}
          <Chip
            label="Left-handed"
            selected={instrument.leftHanded}
            onPress={() => onHand(!instrument.leftHanded)}
            testID={`left-handed-${instrument.id}`}
          />
          <TextLink href={tunePath(instrument.id)} testID={`tune-${instrument.id}`}>
            Tune it
          </TextLink>
        </View>
      </Card>
    </View>
  );
}
