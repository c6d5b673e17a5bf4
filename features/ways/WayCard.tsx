import type { Href } from "expo-router";
import { useId } from "react";
import { Pressable, View } from "react-native";
import { Icon } from "@/features/ui/Icon";
import { RadioDot } from "@/features/ui/RadioDot";
import { Text } from "@/features/ui/Text";
import { linkGap, TextLink } from "@/features/ui/TextLink";
import { colors } from "@/features/ui/theme";
import { tunePath } from "@/features/ui/tunePath";
import { webProps } from "@/features/ui/webStyle";
import type { Instrument } from "@/shared/instruments/instrument";
import type { Way, WayChord } from "@/shared/ways/way";
import { WayGrids } from "./WayGrids";

/** What a player knows, and how to change it. */
export interface ShapeTicks {
  known: readonly string[];
  onKnown: (mark: string, known: boolean) => void;
}

/** Ways on from a way: to its arrangements, and to one of its chords on the whole neck. */
export interface WayLinks {
  arrange: (way: Way) => Href;
  onNeck: (way: Way, chord: WayChord) => Href;
}

export interface WayCardProps {
  way: Way;
  instrument: Instrument;
  chosen: boolean;
  /** keyboard and focus of this one button of the group */
  radio: object;
  onChoose: () => void;
  /** also why it is easy or hard, and how far the hand travels */
  full?: boolean;
  /** where the player may tell which shapes they know */
  ticks?: ShapeTicks | undefined;
  links?: WayLinks | undefined;
  /** where the walk stands that explains this way */
  why?: Href | undefined;
}

/** One way: what to do, what it costs, the shapes, and what to take care of. */
export function WayCard({ way, instrument, chosen, radio, onChoose, full = false, ticks, links, why }: WayCardProps) {
  const id = useId();
  return (
    <>
      <Pressable
        role="radio"
        aria-checked={chosen}
        aria-labelledby={`${id}-title`}
        onPress={onChoose}
        {...webProps({ ...radio, "aria-describedby": `${id}-cost` })}
        style={{ flexDirection: "row", gap: 12, justifyContent: "space-between", minHeight: 44 }}
      >
        <View style={{ flexShrink: 1 }}>
          <Text variant="strong" nativeID={`${id}-title`} style={{ lineHeight: 20 }}>
            {way.title}
          </Text>
          <Text variant="small" tone="soft" nativeID={`${id}-cost`} style={{ lineHeight: 19, marginTop: 2 }}>
            {way.cost}
          </Text>
          {full && (
            <Text variant="small" tone="soft" style={{ lineHeight: 19, marginTop: 2 }} testID="way-why">
              {`${way.why} ${way.travel}`}
            </Text>
          )}
        </View>
        <RadioDot on={chosen} />
      </Pressable>
      <WayGrids way={way} instrument={instrument} onNeck={links && ((chord) => links.onNeck(way, chord))} {...ticks} />
      {chosen && <LinksOn {...{ way, instrument, links, why }} />}
      {way.cautions.length > 0 && <Cautions texts={way.cautions} />}
    </>
  );
}

/** The ways on from a way that is chosen, far enough from each other for a finger. */
function LinksOn({ way, instrument, links, why }: Pick<WayCardProps, "way" | "instrument" | "links" | "why">) {
  if (!links && why === undefined && way.retune === 0 && way.capo === 0) return null;
  return (
    <View style={{ gap: linkGap, marginTop: 16, marginBottom: 8, alignItems: "flex-start" }}>
      {links && (
        <TextLink href={links.arrange(way)} testID="arrange">
          Other shapes and the right hand
        </TextLink>
      )}
      {way.retune !== 0 && (
        <TextLink
          href={{
            pathname: "/instruments/retune",
            params: { instrument: instrument.id, shift: String(way.retune) },
          }}
          testID="to-retune"
        >
          Each string, and the order to tune in
        </TextLink>
      )}
      {(way.retune !== 0 || way.capo > 0) && (
        <TextLink href={tunePath(instrument.id, way.retune, way.capo)}>Tune for this, string by string</TextLink>
      )}
      {why !== undefined && (
        <TextLink href={why} testID="way-to-why">
          Why this works, step by step
        </TextLink>
      )}
    </View>
  );
}

function Cautions({ texts }: { texts: readonly string[] }) {
  return (
    <View style={{ borderTopWidth: 1, borderColor: colors.line, marginTop: 8, paddingTop: 8, gap: 6 }}>
      {texts.map((text) => (
        <View key={text} style={{ flexDirection: "row", gap: 8 }}>
          <Icon name="warning" size={20} color={colors.honeyText} />
          <Text variant="tiny" style={{ flexShrink: 1 }}>
            {text}
          </Text>
        </View>
      ))}
    </View>
  );
}
