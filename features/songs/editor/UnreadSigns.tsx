import { View } from "react-native";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import type { UnreadSign } from "@/shared/songs/chart";

const shown = 6;

/** What on the chord lines could not be read, and where it stands. It is kept as it is. */
export function UnreadSigns({ signs }: { signs: readonly UnreadSign[] }) {
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
            style={{ flexDirection: "row", gap: 8, flexWrap: "wrap" }}
          >
            <Text variant="monoBold" style={{ fontSize: 14, lineHeight: 20 }}>
              {sign.text}
            </Text>
            <Text variant="small">{`line ${sign.line}, column ${sign.column}`}</Text>
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
