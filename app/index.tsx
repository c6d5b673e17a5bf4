import { useWindowDimensions, View } from "react-native";
import { HomeLadder } from "@/features/span/HomeLadder";
import { Heading } from "@/features/ui/Heading";
import { HomeSteps } from "@/features/ui/HomeSteps";
import { LinkButton } from "@/features/ui/LinkButton";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { sizes } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";

const headline = "Sing a few seconds, and know your key and how to play it.";

function Start({ device }: { device: "phone" | "device" }) {
  return (
    <View style={{ gap: 10 }}>
      <LinkButton href="/voice/sing" icon="mic" label="Sing a few seconds" testID="home-sing" />
      <Text variant="small" tone="soft" style={{ textAlign: "center" }}>
        {`The recording stays on this ${device}. `}
        <TextLink href="/voice/by-hand" testID="home-by-hand">
          Set notes by hand
        </TextLink>
      </Text>
    </View>
  );
}

export default function HomeRoute() {
  const layout = useLayout();
  const { width, height } = useWindowDimensions();
  if (layout === "phone") {
    return (
      <Screen title="Larkspan" brand footer={<Start device="phone" />}>
        <Heading level={1} size={width < 380 ? 30 : 36} focusable style={{ marginTop: 12, marginBottom: 24 }}>
          {headline}
        </Heading>
        <HomeLadder width={Math.min(width, 480) - 2 * sizes.gutterPhone} step={height < 760 || width < 380 ? 12 : 15} />
      </Screen>
    );
  }
  const wide = layout === "wide";
  const beside = width >= 760;
  return (
    <Screen title="Larkspan" brand wide>
      <View style={{ flexGrow: 1, justifyContent: "space-between", gap: 32 }}>
        <View
          style={{
            flexDirection: beside ? "row" : "column",
            alignItems: beside ? "center" : "flex-start",
            justifyContent: "space-between",
            gap: wide ? 56 : 24,
            flexGrow: 1,
          }}
        >
          <View style={{ flexShrink: 1, maxWidth: 600, gap: wide ? 32 : 24 }}>
            <Heading level={1} size={wide ? 52 : 36} focusable>
              {headline}
            </Heading>
            <View style={{ alignSelf: "flex-start" }}>
              <Start device="device" />
            </View>
          </View>
          <HomeLadder width={wide ? Math.min(600, width - sizes.rail - 64 - 440) : 340} step={wide ? 18 : 15} />
        </View>
        <HomeSteps />
      </View>
    </Screen>
  );
}
