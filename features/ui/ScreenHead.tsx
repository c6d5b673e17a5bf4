import { Link, type Href } from "expo-router";
import type { ReactNode, Ref } from "react";
import { View, type Text as NativeText, type TextStyle } from "react-native";
import { Heading } from "./Heading";
import { Icon, Mark } from "./Icon";
import { PersonLink } from "./PersonLink";
import { Text } from "./Text";
import { colors, fonts, sizes } from "./theme";
import { webStyle } from "./webStyle";

export interface Crumb {
  label: string;
  href: Href;
}

export interface ScreenHeadProps {
  title: string;
  subtitle?: ReactNode;
  crumb?: Crumb | undefined;
  back?: Href | undefined;
  /** the first page: the name of the house stands at the top instead of a title */
  brand: boolean;
  /** on the phone the title stands large over the content */
  large: boolean;
  /** a cross instead of an arrow, where going back gives something up */
  closes: boolean;
  heading: Ref<NativeText>;
}

const flex = webStyle({ display: "flex" });
const oneLine = { flexShrink: 1, minWidth: 0 } as const;

function BackLink({ href, closes }: { href: Href; closes: boolean }) {
  return (
    <Link
      href={href}
      aria-label={closes ? "Close" : "Back"}
      style={[
        { width: sizes.target, height: sizes.target, alignItems: "center", justifyContent: "center" } as TextStyle,
        flex,
      ]}
    >
      <Icon name={closes ? "close" : "back"} color={colors.ink} />
    </Link>
  );
}

/** Top bar of the phone, 56 high: way back, title, who is singing. */
export function PhoneTop({ title, subtitle, crumb, back, brand, large, closes, heading }: ScreenHeadProps) {
  const way = back ?? crumb?.href;
  return (
    <View
      role="banner"
      style={{
        flexDirection: "row",
        alignItems: "center",
        gap: 8,
        minHeight: sizes.top,
        paddingLeft: way === undefined ? 16 : 4,
        paddingRight: 10,
        flexShrink: 0,
      }}
    >
      {way !== undefined && <BackLink href={way} closes={closes} />}
      {way === undefined && (
        <Link
          href="/"
          aria-label="Larkspan, home"
          style={[
            {
              minHeight: sizes.target,
              minWidth: sizes.target,
              flexDirection: "row",
              alignItems: "center",
              gap: 10,
            } as TextStyle,
            flex,
          ]}
        >
          <Mark />
          {brand && (
            <Text
              style={{
                fontFamily: fonts.display,
                fontWeight: "700",
                fontSize: 20,
                lineHeight: 22,
                letterSpacing: -0.2,
              }}
            >
              Larkspan
            </Text>
          )}
        </Link>
      )}
      <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0, paddingVertical: 6 }}>
        {!brand && (
          <>
            {large ? (
              <Text variant="strong" style={{ lineHeight: 19 }}>
                {crumb?.label}
              </Text>
            ) : (
              <Heading
                ref={heading}
                level={1}
                focusable
                style={{ fontFamily: fonts.text, fontWeight: "600", fontSize: 16, lineHeight: 19, letterSpacing: 0 }}
              >
                {title}
              </Heading>
            )}
            {subtitle !== undefined && (
              <Text variant="tiny" tone="soft" style={[oneLine, { lineHeight: 15, marginTop: 2 }]}>
                {subtitle}
              </Text>
            )}
          </>
        )}
      </View>
      {!closes && <PersonLink />}
    </View>
  );
}

/** Head of a page on wide and middle screens: crumb, title at 36, line of facts, actions at the right. */
export function WideHead({
  title,
  subtitle,
  crumb,
  back,
  brand,
  closes,
  heading,
  actions,
}: ScreenHeadProps & { actions: ReactNode }) {
  if (brand) return null;
  const way = crumb ?? (back === undefined ? undefined : { label: closes ? "Close" : "Back", href: back });
  return (
    <View
      role="banner"
      style={{
        flexDirection: "row",
        flexWrap: "wrap",
        alignItems: "flex-end",
        justifyContent: "space-between",
        columnGap: 24,
        rowGap: 12,
      }}
    >
      <View style={{ flexShrink: 1, minWidth: 0 }}>
        {way && (
          <Link href={way.href} style={[{ minHeight: 24, alignSelf: "flex-start" } as TextStyle]}>
            <Text variant="label" tone="soft">
              {way === crumb ? way.label : `‹ ${way.label}`}
            </Text>
          </Link>
        )}
        <Heading ref={heading} level={1} focusable>
          {title}
        </Heading>
        {subtitle !== undefined && (
          <Text variant="small" tone="soft" style={{ marginTop: 4 }}>
            {subtitle}
          </Text>
        )}
      </View>
      {actions !== undefined && actions !== null && (
        <View style={{ flexDirection: "row", gap: 12, flexWrap: "wrap" }}>{actions}</View>
      )}
    </View>
  );
}
