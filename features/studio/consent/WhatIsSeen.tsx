import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";

/** What teachers see of a pupil who agrees, sentence by sentence. */
export function WhatIsSeen({ sees }: { sees: readonly string[] }) {
  return (
    <ul
      data-testid="what-is-seen"
      style={{
        margin: 0,
        paddingLeft: 20,
        font: `400 16px/24px ${fonts.text}`,
        color: colors.ink,
        display: "flex",
        flexDirection: "column",
        gap: 6,
      }}
    >
      {sees.map((sentence) => (
        <li key={sentence}>
          <Text>{sentence}</Text>
        </li>
      ))}
    </ul>
  );
}
