import { Link } from "expo-router";
import { View, type TextStyle } from "react-native";
import { Icon, Mark } from "./Icon";
import { PersonLink } from "./PersonLink";
import { places, type Place } from "./places";
import { useShell } from "./ShellContext";
import { Text } from "./Text";
import { colors, fonts, mixtures, sizes } from "./theme";
import { webProps, webStyle } from "./webStyle";

const column = webStyle({ display: "flex", flexDirection: "column" });

function PlaceLink({ place, on, style }: { place: Place; on: boolean; style: TextStyle }) {
  const color = on ? colors.plum : colors.inkSoft;
  return (
    <Link
      href={place.href}
      {...(on ? { "aria-current": "page" as const } : null)}
      style={[{ alignItems: "center", justifyContent: "center", gap: 4 }, column, style]}
    >
      <Icon name={place.icon} color={color} />
      <Text variant="tiny" tone={on ? "plum" : "soft"} style={{ fontWeight: on ? "600" : "500", lineHeight: 14 }}>
        {place.label}
      </Text>
    </Link>
  );
}

/** Bar at the foot of the phone. */
export function BottomBar() {
  const { pathname } = useShell();
  return (
    <View
      role="navigation"
      aria-label="Main"
      {...webProps({ dataSet: { bar: "" } })}
      style={[
        {
          flexDirection: "row",
          borderTopWidth: 1,
          borderColor: colors.line,
          backgroundColor: colors.card,
          flexShrink: 0,
          zIndex: 2,
        },
        webStyle({ position: "sticky", bottom: 0, paddingBottom: "env(safe-area-inset-bottom)" }),
      ]}
    >
      {places.map((place) => {
        const on = place.within.test(pathname);
        return (
          <View key={place.label} style={{ flexGrow: 1, flexBasis: 0, alignItems: "stretch" }}>
            {on && (
              <View
                style={{
                  position: "absolute",
                  top: -1,
                  alignSelf: "center",
                  width: 36,
                  height: 3,
                  borderBottomLeftRadius: 3,
                  borderBottomRightRadius: 3,
                  backgroundColor: colors.plum,
                }}
              />
            )}
            <PlaceLink place={place} on={on} style={{ height: sizes.bar - 1 }} />
          </View>
        );
      })}
    </View>
  );
}

/** Rail at the left: 96 with the name on wide screens, narrower on middle ones. */
export function Rail({ wide }: { wide: boolean }) {
  const { pathname } = useShell();
  return (
    <View
      role="navigation"
      aria-label="Main"
      {...webProps({ dataSet: { bar: "" } })}
      style={[
        {
          width: wide ? sizes.rail : sizes.railMiddle,
          flexShrink: 0,
          alignItems: "center",
          borderRightWidth: 1,
          borderColor: colors.line,
          paddingVertical: 20,
          zIndex: 2,
        },
        webStyle({ position: "sticky", top: 0, height: "100dvh", overflowY: "auto" }),
      ]}
    >
      <Link
        href="/"
        aria-label="Larkspan, home"
        style={[{ alignItems: "center", gap: 8, marginBottom: 24, minWidth: 48, minHeight: 48 } as TextStyle, column]}
      >
        <Mark />
        {wide && (
          <Text
            style={{ fontFamily: fonts.display, fontWeight: "700", fontSize: 14, lineHeight: 14, letterSpacing: -0.14 }}
          >
            Larkspan
          </Text>
        )}
      </Link>
      {places.map((place) => {
        const on = place.within.test(pathname);
        return (
          <PlaceLink
            key={place.label}
            place={place}
            on={on}
            style={{
              width: 72,
              height: 64,
              borderRadius: sizes.radius,
              marginBottom: 4,
              backgroundColor: on ? mixtures.selected : "transparent",
            }}
          />
        );
      })}
      <View style={{ flexGrow: 1 }} />
      <PersonLink size={40} />
    </View>
  );
}
