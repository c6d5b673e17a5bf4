import { Link, type Href } from "expo-router";
import { View, type TextStyle } from "react-native";
import { Card } from "@/features/ui/Card";
import { Icon } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import type { Account } from "@/shared/contract/account";

interface Row {
  href: Href;
  label: string;
  hint: string;
}

const rows: Row[] = [
  { href: "/account/security" as Href, label: "Signing in", hint: "E-mail address, password, codes" },
  { href: "/account/sessions" as Href, label: "Sessions", hint: "Where you are signed in" },
  { href: "/account/mail" as Href, label: "Mail", hint: "Which mails you get" },
  {
    href: "/account/sharing" as Href,
    label: "What teachers see",
    hint: "What you agreed to, to take back at any time",
  },
  { href: "/account/data" as Href, label: "Your data", hint: "About you, take it along, erase it" },
];

const adminRow: Row = { href: "/admin" as Href, label: "Administration", hint: "People, health, security events" };

/** The pages of the account, one row each. */
export function AccountRows({ account }: { account: Account }) {
  const all = account.role === "admin" ? [...rows, adminRow] : rows;
  return (
    <Card style={{ padding: 0, paddingVertical: 4 }}>
      <View role="list">
        {all.map(({ href, label, hint }, k) => (
          <View
            key={label}
            role="listitem"
            style={{ borderTopWidth: k === 0 ? 0 : 1, borderColor: colors.line, marginHorizontal: 16 }}
          >
            <Link
              href={href}
              testID={`to-${label.toLowerCase().replaceAll(" ", "-")}`}
              style={[
                { flexDirection: "row", alignItems: "center", gap: 12, minHeight: 64 } as TextStyle,
                webStyle({ display: "flex" }),
              ]}
            >
              <View style={{ flexGrow: 1, flexShrink: 1 }}>
                <Text variant="strong">{label}</Text>
                <Text variant="small" tone="soft">
                  {hint}
                </Text>
              </View>
              <Icon name="forward" size={20} color={colors.inkSoft} />
            </Link>
          </View>
        ))}
      </View>
    </Card>
  );
}
