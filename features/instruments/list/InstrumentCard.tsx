import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Chip } from "@/features/ui/Chip";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { linkGap, TextLink } from "@/features/ui/TextLink";
import { tunePath } from "@/features/ui/tunePath";
import { useUnits } from "@/features/ui/useUnits";
import { webStyle } from "@/features/ui/webStyle";
import { lengthWords } from "@/shared/instruments/units";
import { stringWords, type OfferedInstrument } from "../myInstruments";
import { PhotoFrame } from "../editor/photo/PhotoFrame";

export interface InstrumentCardProps {
  offered: OfferedInstrument;
  busy: boolean;
  onFavourite: () => void;
  onHand: (leftHanded: boolean) => void;
}

/** One instrument of the list: its tuning, whether it is played first, and the ways on from it. */
export function InstrumentCard({ offered: { instrument, own }, busy, onFavourite, onHand }: InstrumentCardProps) {
  const [units] = useUnits();
  const mine = own?.favourite === true;
  const count = instrument.strings.length;
  return (
    <View role="listitem" testID={`instrument-${instrument.id}`} style={webStyle({ display: "flex" })}>
      <Card selected={mine} style={{ flexGrow: 1, flexShrink: 1, gap: 4, minWidth: 0 }}>
        <View style={{ flexDirection: "row", gap: 12 }}>
          <View style={{ flexGrow: 1, flexShrink: 1, gap: 4, minWidth: 0 }}>
            <Heading level={3} size={16}>
              {instrument.name}
            </Heading>
            <Text variant="mono" style={{ fontSize: 14 }}>
              {stringWords(instrument, true)}
            </Text>
            <Text variant="small" tone="soft">
              {`${count} ${count === 1 ? "string" : "strings"}, ${lengthWords(instrument.scaleMm, units)}, ${instrument.frets} frets`}
            </Text>
          </View>
          {own?.photo !== undefined && <PhotoFrame photo={own.photo} name={instrument.name} width={72} />}
        </View>
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
        </View>
        <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 20, rowGap: linkGap, paddingVertical: 12 }}>
          <TextLink
            href={
              own
                ? { pathname: "/instruments/[id]", params: { id: own.id } }
                : { pathname: "/instruments/new", params: { from: instrument.id } }
            }
            testID={`open-${instrument.id}`}
          >
            {own ? "Open and edit" : "Make one like it"}
          </TextLink>
          <TextLink
            href={{ pathname: "/instruments/retune", params: { instrument: instrument.id } }}
            testID={`retune-${instrument.id}`}
          >
            Strings and retune
          </TextLink>
          <TextLink href={tunePath(instrument.id)} testID={`tune-${instrument.id}`}>
            Tune it
          </TextLink>
        </View>
      </Card>
    </View>
  );
}
