import { usePathname } from "expo-router";
import { useCallback, useMemo, useRef, useState, type ReactNode } from "react";
import { View } from "react-native";
import { LiveText } from "./LiveText";
import { MissingChunkBoundary } from "./MissingChunkBoundary";
import { BottomBar, Rail } from "./Navigation";
import { ShellContext, type ShellState } from "./ShellContext";
import { colors } from "./theme";
import { useLayout } from "./useLayout";
import { webStyle } from "./webStyle";

export interface ShellProps {
  /** first letter of who is signed in; null for a visitor */
  initial?: string | null;
  children: ReactNode;
}

/** What surrounds every screen: the way past the navigation, bar or rail, and the voice that says where one has come. */
export function Shell({ initial = null, children }: ShellProps) {
  const pathname = usePathname();
  const layout = useLayout();
  const [barHidden, setBarHidden] = useState(false);
  const [stage, setStage] = useState(false);
  const [said, setSaid] = useState("");
  const lastPath = useRef<string | null>(null);
  /** this page was come to from another one */
  const visited = useRef(false);

  const arrive = useCallback(
    (title: string, heading: HTMLElement | null) => {
      const cameFrom = lastPath.current;
      lastPath.current = pathname;
      if (cameFrom === pathname) {
        // The page stands where its grey bars stood, and the heading that had the focus went with them.
        if (!visited.current || document.activeElement !== document.body) return;
      } else {
        visited.current = cameFrom !== null;
        if (!visited.current) return;
        window.scrollTo(0, 0);
      }
      heading?.focus({ preventScroll: true });
      setSaid(title);
    },
    [pathname],
  );
  const state = useMemo<ShellState>(
    () => ({ pathname, initial, barHidden, setBarHidden, setStage, arrive }),
    [pathname, initial, barHidden, arrive],
  );
  const phone = layout === "phone";

  return (
    <ShellContext.Provider value={state}>
      <a className="skip" href="#main">
        Skip to the content
      </a>
      <View
        style={[
          { flexGrow: 1, flexDirection: phone ? "column" : "row", backgroundColor: colors.paper },
          webStyle({ minHeight: "100dvh" }),
        ]}
      >
        {!phone && !stage && <Rail wide={layout === "wide"} />}
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: phone ? "auto" : 0, minWidth: 0 }}>
          <MissingChunkBoundary path={pathname}>{children}</MissingChunkBoundary>
        </View>
        {phone && !barHidden && !stage && <BottomBar />}
      </View>
      <LiveText hidden>{said}</LiveText>
    </ShellContext.Provider>
  );
}
