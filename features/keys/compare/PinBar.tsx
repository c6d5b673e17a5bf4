import { View } from "react-native";
import { Button } from "@/features/ui/Button";
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
  const { rows, room } = pinning;
  if (rows.length === 0) return null;
  const signs = rows.map(({ sign }) => sign).join(", ");
  const more = rows.length === 1 ? " Pin another one to compare them." : room ? "" : " Four is the most.";
  return (
    <View
      testID="pin-bar"
      {...webProps({ "data-bar": "" })}
      style={[
        {
          flexDirection: "row",
          flexWrap: "wrap",
          alignItems: "center",
          justifyContent: "space-between",
          columnGap: 12,
          rowGap: 4,
          marginTop: 16,
          paddingVertical: 8,
          paddingHorizontal: 16,
          borderRadius: sizes.radius,
          borderWidth: 1.5,
          borderColor: colors.plum,
          backgroundColor: colors.card,
          zIndex: 4,
        },
        webStyle({ position: "sticky", bottom: phone ? `calc(${sizes.bar + 8}px + env(safe-area-inset-bottom))` : 12 }),
      ]}
    >
      <View style={{ flexShrink: 1, flexGrow: 1, flexBasis: phone ? 120 : "auto" }}>
        <LiveText variant="small" style={{ fontWeight: "500" }}>
          {`Pinned: ${signs}.${more}`}
        </LiveText>
      </View>
      <View style={{ flexDirection: "row", alignItems: "center", gap: 8 }}>
        <Button
          kind="text"
          small
          label={phone ? "Unpin" : "Unpin all"}
          accessibleName="Unpin all"
          onPress={pinning.clear}
          testID="unpin-all"
        />
        {rows.length > 1 && (
          <LinkButton
            small
            label={`Compare ${rows.length} keys`}
            href={{
              pathname: "/songs/[id]/compare",
              params: { id: songId, keys: rows.map(({ shift }) => shift).join(",") },
            }}
            testID="compare-pinned"
          />
        )}
      </View>
    </View>
  );
}
