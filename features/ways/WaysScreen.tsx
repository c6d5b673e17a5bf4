import type { ReactNode } from "react";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";

export interface WaysScreenProps {
  song: { id: string; title: string };
  /** sounding key with glyphs */
  sign: string;
  /** name and strings, such as "Box guitar, A D F♯" */
  instrument: string;
  chooser: ReactNode;
  list: ReactNode;
  use: ReactNode;
  /** the chart in this key */
  chart: ReactNode;
  /** the decided key, with when and why */
  decided: ReactNode;
  error: Error | null;
  /** what the player would do without, and the shapes they know */
  wishes: ReactNode;
}

/** Ways to play one song in one key, side by side where there is room; under them the chart in that key. */
export function WaysScreen({
  song,
  sign,
  instrument,
  chooser,
  list,
  use,
  chart,
  decided,
  error,
  wishes,
}: WaysScreenProps) {
  const phone = useLayout() === "phone";
  const main = (
    <View style={{ gap: 8 }}>
      {error && (
        <Notice kind="error" title="This is not saved">{`${error.message} The ways are still here; try again.`}</Notice>
      )}
      {chooser}
      {wishes}
      {list}
      {decided}
    </View>
  );
  const aside = (
    <View
      testID="moved-chart"
      style={{
        gap: 10,
        ...(phone ? { borderTopWidth: 1, borderColor: colors.line, paddingTop: 16, marginTop: 20 } : null),
      }}
    >
      <Heading level={2}>{`Chart in ${sign}`}</Heading>
      {chart}
    </View>
  );
  return (
    <Screen
      title={`Ways to play it in ${sign}`}
      subtitle={instrument}
      crumb={{ label: song.title, href: { pathname: "/songs/[id]", params: { id: song.id } } }}
      wide
      footer={use ?? undefined}
    >
      {phone ? (
        <>
          {main}
          {aside}
        </>
      ) : (
        <View style={{ gap: 32 }}>
          {main}
          {aside}
        </View>
      )}
    </Screen>
  );
}
