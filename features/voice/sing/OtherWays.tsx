import { Link } from "expo-router";
import type { TextStyle } from "react-native";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Icon, type IconName } from "@/features/ui/Icon";
import { LinkButton } from "@/features/ui/LinkButton";
import { Text } from "@/features/ui/Text";
import { colors, sizes } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";

export interface OtherWaysProps {
  /** a line of plain links under a button, or a list with its own heading where there is room */
  kind: "text" | "list";
  /** the way one is on already is not another one */
  except: "recording" | "sing" | "guided";
}

interface Way {
  id: "recording" | "by-hand" | "sing";
  icon: IconName;
  label: string;
  hint: string;
  href: "/voice/upload" | "/voice/by-hand" | "/voice/sing";
  testID: string;
}

const ways: readonly Way[] = [
  {
    id: "sing",
    icon: "mic",
    label: "Sing a few seconds",
    hint: "Any song you know, without an instrument.",
    href: "/voice/sing",
    testID: "sing-instead",
  },
  {
    id: "recording",
    icon: "file",
    label: "Use a recording",
    hint: "One voice singing alone. It is read on this device.",
    href: "/voice/upload",
    testID: "sing-upload",
  },
  {
    id: "by-hand",
    icon: "edit",
    label: "Set notes by hand",
    hint: "If you know your lowest and your highest note.",
    href: "/voice/by-hand",
    testID: "sing-by-hand",
  },
];

/** The other ways to one's notes. */
export function OtherWays({ kind, except }: OtherWaysProps) {
  const others = ways.filter(({ id }) => id !== except);
  if (kind === "list") {
    return (
      <View role="region" aria-label="Other ways to your notes" style={{ gap: 10 }}>
        <Heading level={2} size={16}>
          Other ways to your notes
        </Heading>
        {others.map((way) => (
          <WayRow key={way.id} {...way} />
        ))}
      </View>
    );
  }
  return (
    <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
      {others.map(({ id, icon, label, href, testID }) => (
        <LinkButton
          key={id}
          kind="text"
          icon={icon}
          label={label}
          href={href}
          testID={testID}
          style={{ flexGrow: 1 }}
        />
      ))}
    </View>
  );
}

function WayRow({ icon, label, hint, href, testID }: Way) {
  return (
    <Link
      href={href}
      testID={testID}
      style={[
        {
          flexDirection: "row",
          alignItems: "center",
          gap: 14,
          minHeight: 64,
          paddingHorizontal: 16,
          paddingVertical: 10,
          borderRadius: sizes.radius,
          borderWidth: 1,
          borderColor: colors.line,
          backgroundColor: colors.card,
        } as TextStyle,
        webStyle({ display: "flex" }),
      ]}
    >
      <Icon name={icon} size={22} color={colors.plum} />
      <View style={{ flexGrow: 1, flexShrink: 1 }}>
        <Text variant="label" tone="plum">
          {label}
        </Text>
        <Text variant="small" tone="soft">
          {hint}
        </Text>
      </View>
      <Icon name="forward" size={20} color={colors.plum} />
    </Link>
  );
}
