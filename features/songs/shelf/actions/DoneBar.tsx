import { createPortal } from "react-dom";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { IconButton } from "@/features/ui/IconButton";
import { LinkButton } from "@/features/ui/LinkButton";
import { Text } from "@/features/ui/Text";
import { colors, sizes } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webProps, webStyle } from "@/features/ui/webStyle";
import type { SongActions } from "./useSongActions";

/** Height of the buttons at the foot of a phone, with some air. */
const foot = 86;

/** What was just done, at the foot of the window, with the way back; it stays until it is closed or something else is done. */
export function DoneBar({ actions: { notice, error, dismiss } }: { actions: SongActions }) {
  const phone = useLayout() === "phone";
  const words = error ? `It is as it was. ${error.message}` : (notice?.words ?? null);
  // Outside the page, so that the buttons at its foot never lie over it.
  return createPortal(
    <View
      role="status"
      {...webProps({ "aria-live": "polite" })}
      testID="done-bar"
      style={webStyle({
        position: "fixed",
        zIndex: 5,
        left: phone ? 8 : sizes.rail + 32,
        right: phone ? 8 : "auto",
        bottom: phone ? `calc(${sizes.bar + foot}px + env(safe-area-inset-bottom))` : 24,
        pointerEvents: words === null ? "none" : "auto",
      })}
    >
      {words !== null && (
        <View
          style={{
            flexDirection: "row",
            alignItems: "center",
            gap: 4,
            paddingLeft: 16,
            borderRadius: sizes.radius,
            borderWidth: 1.5,
            borderColor: error ? colors.brick : colors.ink,
            borderStyle: error ? "dashed" : "solid",
            backgroundColor: colors.card,
            maxWidth: 640,
          }}
        >
          <Text
            variant="small"
            tone={error ? "brick" : "ink"}
            style={{ flexShrink: 1, flexGrow: 1, paddingVertical: 8 }}
          >
            {words}
          </Text>
          {!error && notice?.undo && <Button kind="text" small label="Undo" onPress={notice.undo} testID="undo" />}
          {!error && notice !== null && notice.open !== null && (
            <LinkButton
              kind="text"
              small
              label="Open"
              href={{ pathname: "/songs/[id]", params: { id: notice.open } }}
              testID="open-copy"
            />
          )}
          <IconButton icon="close" label="Close this note" onPress={dismiss} color={colors.inkSoft} />
        </View>
      )}
    </View>,
    document.body,
  );
}
