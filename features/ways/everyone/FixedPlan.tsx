import { View } from "react-native";
import { Icon } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import {
  fixedName,
  keyFit,
  keyList,
  playableKeys,
  suited,
  type FixedInstrument,
} from "@/shared/keys/fixed/fixedInstrument";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";

export interface FixedPlanProps {
  instrument: FixedInstrument;
  into: KeyName;
}

/** Whether an instrument made in one key plays the shared key, how, and else which one would. */
export function FixedPlan({ instrument, into }: FixedPlanProps) {
  const { fits, how } = keyFit(instrument, into);
  const sign = glyphs(keySign(into));
  const others = suited(instrument.kind, into);
  return (
    <View style={{ gap: 8 }} testID={fits ? "fixed-fits" : "fixed-does-not-fit"}>
      <View style={{ flexDirection: "row", gap: 8 }}>
        <Icon name={fits ? "check" : "warning"} size={20} color={fits ? colors.lagoon : colors.honeyText} />
        <Text variant="strong" style={{ flexShrink: 1, lineHeight: 20 }}>
          {fits ? `Plays ${sign}: ${how}.` : `Does not play ${sign}: it ${how}.`}
        </Text>
      </View>
      <Text variant="small" tone="soft">
        {`A ${fixedName(instrument)} plays ${keyList(playableKeys(instrument, into.mode))}.`}
        {!fits &&
          others.length > 0 &&
          ` For ${sign}, take ${others.map((each) => `a ${fixedName(each)}`).join(" or ")}.`}
        {!fits && others.length === 0 && ` None that is sold plays ${sign}.`}
      </Text>
    </View>
  );
}
