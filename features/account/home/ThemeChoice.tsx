import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import { useTheme } from "@/features/ui/ThemeProvider";

const options = [
  { value: "morning", label: "Morning" },
  { value: "lamplight", label: "Lamplight" },
  { value: "system", label: "As the system" },
] as const;

/** Light or dark, kept on this device. */
export function ThemeChoice() {
  const { scheme, followsSystem, setScheme } = useTheme();
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>Light</Heading>
      <Segmented
        label="Light"
        options={options}
        value={followsSystem ? "system" : scheme}
        onChange={(value) => setScheme(value === "system" ? null : value)}
        testID="theme-choice"
      />
      <Text variant="small" tone="soft">
        Morning is light, lamplight is dark. The choice is kept on this device.
      </Text>
    </Card>
  );
}
