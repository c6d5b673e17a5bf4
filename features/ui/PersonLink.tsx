import { Link } from "expo-router";
import { View, type TextStyle } from "react-native";
import { Icon } from "./Icon";
import { useShell } from "./ShellContext";
import { Text } from "./Text";
import { colors, fonts, sizes } from "./theme";
import { webStyle } from "./webStyle";

/** The round sign of who is singing; leads to the account. */
export function PersonLink({ size = 36 }: { size?: 36 | 40 }) {
  const { initial, pathname } = useShell();
  return (
    <Link
      href="/account"
      aria-label={initial === null ? "Account and settings" : `Account and settings, signed in as ${initial}`}
      {...(pathname.startsWith("/account") ? { "aria-current": "page" as const } : null)}
      style={[
        { width: sizes.target, height: sizes.target, alignItems: "center", justifyContent: "center" } as TextStyle,
        webStyle({ display: "flex" }),
      ]}
    >
      <View
        style={{
          width: size,
          height: size,
          borderRadius: size / 2,
          borderWidth: 1.5,
          borderColor: initial === null ? colors.inkSoft : colors.plum,
          alignItems: "center",
          justifyContent: "center",
        }}
      >
        {initial === null ? (
          <Icon name="person" size={20} color={colors.inkSoft} />
        ) : (
          <Text variant="strong" tone="plum" style={{ fontFamily: fonts.display, lineHeight: 20 }}>
            {initial}
          </Text>
        )}
      </View>
    </Link>
  );
}
