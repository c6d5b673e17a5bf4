import type { Href } from "expo-router";
import { useEffect, useRef, type ReactNode } from "react";
import { View, type Text as NativeText } from "react-native";
import { Heading } from "./Heading";
import { PhoneFoot } from "./PhoneFoot";
import { PhoneTop, WideHead, type Crumb } from "./ScreenHead";
import { useShell } from "./ShellContext";
import { sizes } from "./theme";
import { useLayout } from "./useLayout";
import { webProps, webStyle } from "./webStyle";

export interface ScreenProps {
  /** the h1 and the title of the document */
  title: string;
  subtitle?: ReactNode;
  /** where this page stands: shown above the title on wide screens, the way back on the phone */
  crumb?: Crumb | undefined;
  /** way back, where there is no crumb or another way than it */
  back?: Href | undefined;
  /** the way back is a cross: leaving gives something up */
  closes?: boolean;
  /** no bar at the foot of the phone: while recording */
  hideBar?: boolean;
  /** head of a wide page, at the right; on the phone at the foot unless there is a footer */
  actions?: ReactNode;
  /** the primary action(s), in reach of the thumb; on wide screens in the head unless there are actions */
  footer?: ReactNode;
  /** the whole width of 1280; else a column of 760 */
  wide?: boolean;
  /** the first page: name of the house instead of a title; the page brings its own h1 */
  brand?: boolean;
  /** on the phone: the title stands large over the content, and the bar names the place it belongs to */
  large?: boolean;
  children: ReactNode;
}

/** One page: sets the title, takes the focus to its h1 when one comes to it, and lays out head, content and actions. */
export function Screen({
  title,
  subtitle,
  crumb,
  back,
  closes = false,
  hideBar = false,
  actions,
  footer,
  wide = false,
  brand = false,
  large = false,
  children,
}: ScreenProps) {
  const { pathname, arrive, setBarHidden } = useShell();
  const phone = useLayout() === "phone";
  const heading = useRef<NativeText>(null);
  const titleNow = useRef(title);

  useEffect(() => {
    titleNow.current = title;
    document.title = title === "Larkspan" ? title : `${title} · Larkspan`;
  }, [title]);
  useEffect(() => {
    const own = heading.current as unknown as HTMLElement | null;
    arrive(titleNow.current, own ?? document.querySelector<HTMLElement>("h1"));
  }, [pathname, arrive]);
  useEffect(() => {
    setBarHidden(hideBar);
    return () => setBarHidden(false);
  }, [hideBar, setBarHidden]);

  const head = { title, subtitle, crumb, back, brand, large, closes, heading };
  const foot = footer ?? actions;
  // One tree for both layouts, so that nothing on the page is lost when a phone is turned or a window is drawn wider.
  return (
    <View style={phone ? { flexGrow: 1 } : aroundWide}>
      {phone ? <PhoneTop {...head} /> : <WideHead {...head} actions={actions ?? footer} />}
      <View
        role="main"
        nativeID="main"
        {...webProps({ tabIndex: -1 })}
        style={[
          { flexGrow: 1 },
          phone ? null : { width: "100%", maxWidth: wide ? sizes.content : 760 },
          webStyle({ outlineStyle: "none" }),
        ]}
      >
        <View
          style={[
            { flexGrow: 1 },
            phone ? { paddingHorizontal: sizes.gutterPhone, paddingBottom: foot ? 8 : 24 } : null,
          ]}
        >
          {phone && large && (
            <Heading ref={heading} level={1} size={26} focusable style={{ marginTop: 2, marginBottom: 12 }}>
              {title}
            </Heading>
          )}
          {children}
        </View>
        {phone && foot !== undefined && foot !== null && (
          <PhoneFoot style={{ paddingHorizontal: sizes.gutterPhone }}>{foot}</PhoneFoot>
        )}
      </View>
    </View>
  );
}

const aroundWide = {
  flexGrow: 1,
  paddingHorizontal: sizes.gutterWide,
  paddingTop: 24,
  paddingBottom: 40,
  gap: 20,
  width: "100%",
  maxWidth: sizes.content + 2 * sizes.gutterWide,
} as const;
