import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { IconButton } from "@/features/ui/IconButton";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { colors, sizes } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webProps, webStyle } from "@/features/ui/webStyle";
import type { Pinning } from "./pins";

export interface PinBarProps {
  songId: string;
  pinning: Pinning;
}

/** Says at the foot of the page which keys are pinned, and leads to them side by side. */
export function PinBar({ songId, pinning }: PinBarProps) {
  const phone = useLayout() === "phone";
  if (pinning.rows.length === 0) return null;
  return (
    <View
      testID="pin-bar"
      {...webProps({ dataSet: { bar: "" } })}
      style={[
        {
          flexDirection: "row",
          alignItems: "center",
          columnGap: 4,
          marginTop: 16,
          paddingVertical: 6,
          paddingLeft: 16,
          paddingRight: 8,
          borderRadius: sizes.radius,
          borderWidth: 1.5,
          borderColor: colors.plum,
          backgroundColor: colors.card,
          zIndex: 4,
        },
        webStyle({ position: "sticky", bottom: phone ? `calc(${sizes.bar + 8}px + env(safe-area-inset-bottom))` : 12 }),
      ]}
    >
      <View style={{ flexShrink: 1, flexGrow: 1 }}>
        <LiveText variant="small" style={{ fontWeight: "500" }}>
          {pinnedWords(pinning)}
        </LiveText>
      </View>
      <IconButton icon="close" label="Unpin all" color={colors.plum} onPress={pinning.clear} testID="unpin-all" />
      <CompareLink songId={songId} pinning={pinning} kind="primary" />
    </View>
  );
}

/** The same as words in a row of others: the wide page has its button in the head. */
export function PinLine({ pinning }: { pinning: Pinning }) {
  return (
    <View {...webProps({ dataSet: { bar: "" } })} style={{ flexDirection: "row", alignItems: "center", columnGap: 4 }}>
      <LiveText variant="small" tone="soft" testID="pin-line">
        {pinning.rows.length === 0 ? "" : pinnedWords(pinning)}
      </LiveText>
      {pinning.rows.length > 0 && (
        <Button
          kind="text"
          small
          label="Unpin all"
          onPress={pinning.clear}
          testID="unpin-all"
          style={{ marginVertical: -8 }}
        />
      )}
    </View>
  );
}

/** Leads to the pinned keys side by side, once there are two. */
export function CompareLink({ songId, pinning: { rows }, kind }: PinBarProps & { kind: "primary" | "secondary" }) {
  if (rows.length < 2) return null;
  return (
    <LinkButton
      small
      kind={kind}
      label={`Compare ${rows.length} keys`}
      href={{
        pathname: "/songs/[id]/compare",
        params: { id: songId, keys: rows.map(({ shift }) => shift).join(",") },
      }}
      testID="compare-pinned"
    />
  );
}

function pinnedWords({ rows, room }: Pinning): string {
  const signs = rows.map(({ sign }) => sign).join(", ");
  if (rows.length === 1) return `Pinned: ${signs}. Pin another one to compare.`;
  return room ? `Pinned: ${signs}.` : `${signs}. Four is the most.`;
}
