import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import type { UnreadSign } from "@/shared/songs/chart";

const shown = 6;

/** What on the chord lines could not be read, and where it stands: each leads there. It is kept as it is. */
export function UnreadSigns({ signs, onShow }: { signs: readonly UnreadSign[]; onShow: (sign: UnreadSign) => void }) {
  if (signs.length === 0) return null;
  const more = signs.length - shown;
  return (
    <Notice
      kind="caution"
      testID="unread"
      title={
        signs.length === 1 ? "One sign cannot be read as a chord" : `${signs.length} signs cannot be read as chords`
      }
    >
      <View role="list">
        {signs.slice(0, shown).map((sign) => (
          <View
            role="listitem"
            key={`${sign.line},${sign.column}`}
            style={{ flexDirection: "row", columnGap: 8, flexWrap: "wrap", alignItems: "center" }}
          >
            <Text variant="monoBold" style={{ fontSize: 14, lineHeight: 20 }}>
              {sign.text}
            </Text>
            <Button
              kind="text"
              small
              label={`line ${sign.line}, column ${sign.column}`}
              accessibleName={`${sign.text}: go to line ${sign.line}, column ${sign.column}`}
              onPress={() => onShow(sign)}
            />
          </View>
        ))}
      </View>
      {more > 0 && <Text variant="small">{`and ${more} more`}</Text>}
      <Text variant="small" tone="soft">
        {signs.length === 1
          ? "It stays as it is and is not moved into another key."
          : "They stay as they are and are not moved into another key."}
      </Text>
    </Notice>
  );
}
