import { Link, useRouter, type Href } from "expo-router";
import { useEffect, useMemo, useRef, useState, useSyncExternalStore } from "react";
import { useWindowDimensions, View, type Text as NativeText, type TextStyle } from "react-native";
import { Chip } from "@/features/ui/Chip";
import { Heading } from "@/features/ui/Heading";
import { Icon } from "@/features/ui/Icon";
import { IconButton } from "@/features/ui/IconButton";
import { useShell } from "@/features/ui/ShellContext";
import { Text } from "@/features/ui/Text";
import { colors, schemeStyle } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import type { Sheet } from "@/shared/sheets/sheet";
import { sheetRows } from "@/shared/sheets/sheetChart";
import { rowHeight } from "@/shared/sheets/sheetRowPieces";
import { playedChart, scrollSpeed, type SongLength } from "@/shared/sheets/stageSong";
import { useSheetHabits } from "../sheetHabits";
import { columnsIn, SheetLines } from "../SheetLines";
import { StageBar } from "./StageBar";
import { stageAct, tappedTempo, withTap } from "./stageKeys";
import { useStageScroll } from "./useStageScroll";
import { useWakeLock } from "./useWakeLock";

export interface StageScreenProps {
  sheet: Sheet;
  length: SongLength;
  /** back to the sheet */
  back: Href;
}

const sizes = [20, 24, 30, 38, 48] as const;
const edge = 16;

/** The words in large letters on black, passing by at the song's pace; hands free, or by pedal, key and tap. */
export function StageScreen({ sheet, length, back }: StageScreenProps) {
  const router = useRouter();
  const { arrive, setStage } = useShell();
  const { width } = useWindowDimensions();
  const [{ shows, numbers }] = useSheetHabits();
  const [step, setStep] = useState(width < 600 ? 1 : width < 1024 ? 2 : 3);
  const [pace, setPace] = useState(Math.round(length.tempo));
  const [beat, setBeat] = useState<number | null>(null);
  const taps = useRef<number[]>([]);
  const beats = useRef(0);
  const scroller = useRef<HTMLDivElement>(null);
  const heading = useRef<NativeText>(null);
  const wake = useWakeLock();
  const paged = useReducedMotion();
  const size = sizes[step]!;
  const columns = columnsIn(Math.min(width, 1280) - 2 * edge - 8, size);
  const played = useMemo(() => ({ ...sheet, chart: playedChart(sheet.chart) }), [sheet]);
  const rows = useMemo(() => sheetRows(played, { shows, numbers }, columns), [played, shows, numbers, columns]);
  const { tops, height } = useMemo(() => {
    let top = 0;
    const all = rows.map((row) => [top, (top += rowHeight(row, size))] as const);
    return { tops: all.map(([begin]) => begin), height: top };
  }, [rows, size]);
  const stage = useStageScroll({
    ...{ scroller, tops, height, paged },
    speed: scrollSpeed(height, length.quarters, pace),
    onTime: (seconds) => {
      beats.current += (seconds * pace * length.beats) / (60 * length.barQuarters);
      setBeat(Math.floor(beats.current) % length.beats);
    },
  });
  const change = (by: number) => setPace((now) => Math.min(240, Math.max(30, now + by)));
  const tap = () => {
    taps.current = withTap(taps.current, performance.now());
    const tempo = tappedTempo(taps.current);
    if (tempo !== null) setPace(tempo);
  };
  const { running, row, turn, toggle } = stage;

  useEffect(() => {
    setStage(true);
    document.title = `${sheet.title} on stage · Larkspan`;
    arrive(`${sheet.title} on stage`, heading.current as unknown as HTMLElement | null);
    return () => setStage(false);
  }, [sheet.title, arrive, setStage]);
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      const onButton = event.target instanceof Element && event.target.closest("button,a,[role=button]") !== null;
      const act = stageAct(event, onButton);
      if (act === null) return;
      event.preventDefault();
      if (act === "start-stop") toggle();
      else if (act === "forward" || act === "back") turn(act === "forward");
      else if (act === "faster" || act === "slower") change(act === "faster" ? 2 : -2);
      else if (act === "tap") tap();
      else router.replace(back);
    };
    window.addEventListener("keydown", press);
    return () => window.removeEventListener("keydown", press);
  });

  return (
    <View
      testID="stage"
      style={[
        { backgroundColor: colors.paper, zIndex: 20 },
        webStyle({
          ...schemeStyle("lamplight"),
          position: "fixed",
          inset: 0,
          display: "flex",
          flexDirection: "column",
        }),
      ]}
    >
      <View
        role="banner"
        style={{ paddingHorizontal: edge, paddingTop: 6, borderBottomWidth: 1, borderColor: colors.line }}
      >
        <View style={{ flexDirection: "row", alignItems: "center", minHeight: 54, marginHorizontal: -12 }}>
          <Link
            href={back}
            replace
            aria-label="Leave stage view"
            style={[closeBox as TextStyle, webStyle({ display: "flex" })]}
          >
            <Icon name="close" color={colors.ink} />
          </Link>
          <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0, paddingHorizontal: 4 }}>
            <Heading ref={heading} level={1} size={16} focusable style={{ lineHeight: 19 }}>
              {sheet.title}
            </Heading>
            <Text variant="tiny" tone="soft">
              {wakeWords[wake]}
            </Text>
          </View>
          <IconButton icon="minus" label="Smaller letters" disabled={step === 0} onPress={() => setStep(step - 1)} />
          <Text variant="strong" aria-hidden>
            A
          </Text>
          <IconButton
            icon="plus"
            label="Larger letters"
            disabled={step === sizes.length - 1}
            onPress={() => setStep(step + 1)}
          />
        </View>
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8, paddingBottom: 10 }} testID="stage-chips">
          {chips(sheet).map((words) => (
            <Chip key={words} label={words} />
          ))}
        </View>
      </View>
      <div
        ref={scroller}
        id="main"
        role="main"
        tabIndex={0}
        data-testid="stage-scroll"
        onClick={(event) =>
          turn(event.clientY > event.currentTarget.getBoundingClientRect().top + event.currentTarget.clientHeight / 2)
        }
        style={{
          flex: "1 1 0",
          minHeight: 0,
          overflowY: "auto",
          overscrollBehavior: "contain",
          outline: "none",
          padding: `12px ${edge}px 40vh`,
        }}
      >
        {rows.length === 0 ? (
          <Text tone="soft">This song has no chart yet.</Text>
        ) : (
          <SheetLines rows={rows} size={size} level={2} now={row} />
        )}
      </div>
      <StageBar
        {...{ pace, running, beat: running ? beat : null, beats: length.beats }}
        onPace={change}
        onTap={tap}
        onToggle={toggle}
        said={running ? (paged ? "Pages turn by themselves" : "Scrolling") : "Stopped"}
      />
    </View>
  );
}

const closeBox = { width: 48, height: 48, alignItems: "center", justifyContent: "center" } as const;

const wakeWords = {
  asking: "Asking to keep the screen on",
  held: "The screen stays on",
  refused: "The screen may go dark: the device did not allow to keep it on",
  "unknown-here": "The screen may go dark: this browser cannot keep it on",
} as const;

function chips({ instrument, key }: Sheet): string[] {
  const heard = key ? [`Sounds in ${glyphs(keySign(key))}`] : [];
  if (!instrument) return heard;
  const { capo, retune, shapeKey } = instrument;
  const tuned = retune === 0 ? [] : [`All strings ${Math.abs(retune)} ${retune < 0 ? "down" : "up"}`];
  const clamped = capo > 0 ? [`Capo ${capo}`] : retune === 0 ? ["As tuned"] : ["No capo"];
  return [...tuned, ...clamped, `Shapes in ${glyphs(keySign(shapeKey))}`, ...heard];
}

const calm = () =>
  typeof window.matchMedia === "function" ? window.matchMedia("(prefers-reduced-motion: reduce)") : null;

function useReducedMotion(): boolean {
  return useSyncExternalStore(
    (listener) => {
      const query = calm();
      query?.addEventListener("change", listener);
      return () => query?.removeEventListener("change", listener);
    },
    () => calm()?.matches ?? false,
  );
}
