import { useCallback, useState } from "react";
import { useWindowDimensions, View } from "react-native";
import { LevelMeter } from "@/features/span/LevelMeter";
import { meterLevel } from "@/features/span/meterLevel";
import { PitchTrail, TrailLegend } from "@/features/span/PitchTrail";
import { Screen } from "@/features/ui/Screen";
import { StopButton } from "@/features/ui/StopButton";
import { Text } from "@/features/ui/Text";
import { colors, mixtures, sizes } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { HeldSoFar } from "./HeldSoFar";
import { noteNow, type NoteNow } from "./noteNow";
import { noteWord } from "../noteWords";
import { timeOf, type LiveSound } from "../recorder/liveSound";
import { enoughTakeS, longestTakeS } from "../recorder/takeProtocol";
import { useHeard } from "./useHeard";

export interface ListeningScreenProps {
  live: LiveSound;
  seconds: number;
  stopping: boolean;
  onStop: () => void;
}

/** Room for the head, the note, level, time and Stop; the trail has what is left. */
const aroundTrail = 56 + 72 + 224;
/** On a wide page only the head stands over the trail; the rest has a column of its own. */
const aroundWideTrail = 132 + 40;
const sideWidth = 344;
const underLadder = 72 + 24 + 210;

/** Level and time are read at a glance, also where the page is broad. */
const widestRows = 600;

/** What is measured ends this long before the sound does: half a window, and the block on its way. */
const behindS = 0.045;

/** While singing: the note, the trail, how loud and how long, and Stop under the thumb. */
export function ListeningScreen({ live, seconds, stopping, onStop }: ListeningScreenProps) {
  const layout = useLayout();
  const { height } = useWindowDimensions();
  const head = {
    title: "Listening",
    subtitle: "Any song you know, no instrument",
    back: "/voice",
    closes: true,
  } as const;
  const readings = (
    <>
      <LiveLevel live={live} />
      <TimeRow seconds={seconds} />
      <Text variant="small" tone="soft" style={{ marginTop: -6, paddingLeft: 56 }}>
        {`${enoughTakeS} s is enough. More is surer, up to ${longestTakeS} s.`}
      </Text>
      <StopButton stopping={stopping} onStop={onStop} round={layout !== "phone"} />
    </>
  );
  if (layout === "wide") {
    const trail = Math.max(420, Math.min(840, height - aroundWideTrail));
    return (
      <Screen {...head} hideBar wide>
        <View style={{ flexDirection: "row", gap: 48 }}>
          <View style={{ flexGrow: 1, flexBasis: 0 }}>
            <LiveTrail live={live} height={trail} />
          </View>
          <View style={{ width: sideWidth, gap: 24 }}>
            <NoteWords live={live} />
            <HeldSoFar live={live} width={sideWidth} height={Math.max(200, trail - underLadder)} />
            <View style={{ gap: 14 }}>{readings}</View>
          </View>
        </View>
      </Screen>
    );
  }
  const phone = layout === "phone";
  return (
    <Screen {...head} hideBar>
      <NoteWords live={live} />
      <View style={{ marginTop: 12, marginHorizontal: phone ? -sizes.gutterPhone : 0 }}>
        <LiveTrail live={live} height={Math.max(220, Math.min(560, height - aroundTrail - (phone ? 0 : 40)))} />
      </View>
      <View style={{ gap: 14, paddingTop: 16, marginTop: "auto", width: "100%", maxWidth: widestRows }}>
        {readings}
      </View>
    </Screen>
  );
}

function NoteWords({ live }: { live: LiveSound }) {
  // Only what is shown: the note, its words and its tenths of a second.
  const shown = useHeard(live, noteSign);
  const note = shown === "" ? null : noteOf(live);
  return (
    <View style={{ flexDirection: "row", alignItems: "center", gap: 16, paddingTop: 8, minHeight: 60 }}>
      <Text
        variant="number"
        style={{ lineHeight: 52, letterSpacing: -1, minWidth: 64 }}
        testID="note-now"
        aria-hidden={note === null}
      >
        {note ? noteWord(note.midi) : "–"}
      </Text>
      <View style={{ flexGrow: 1, flexShrink: 1 }}>
        <Text variant="small" tone={note?.words === "On the line" ? "lagoon" : "ink"} style={{ fontWeight: "600" }}>
          {note?.words ?? "Sing when you are ready"}
        </Text>
        <Text variant="small" tone="soft">
          {note ? `held ${note.heldS.toFixed(1)} s` : " "}
        </Text>
      </View>
      <TrailLegend />
    </View>
  );
}

/** A note that is not decided yet is shown all the same: the singer hears it now. */
function noteOf({ frames, ahead }: LiveSound): NoteNow | null {
  return noteNow([...frames, ...ahead]);
}

function noteSign(live: LiveSound): string {
  const note = noteOf(live);
  return note ? `${note.midi} ${note.words} ${note.heldS.toFixed(1)}` : "";
}

function LiveTrail({ live, height }: { live: LiveSound; height: number }) {
  const [width, setWidth] = useState(0);
  const read = useCallback(
    () => ({
      frames: live.frames,
      ahead: live.ahead,
      now: Math.max(0, timeOf(live, performance.now()) - behindS),
    }),
    [live],
  );
  return (
    <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ height }}>
      {width > 0 && <PitchTrail read={read} width={width} height={height} testID="pitch-trail" />}
    </View>
  );
}

function LiveLevel({ live }: { live: LiveSound }) {
  const levelDb = useHeard(live, meterLevel);
  return <LevelMeter levelDb={levelDb} />;
}

function TimeRow({ seconds }: { seconds: number }) {
  const words = `${Math.floor(seconds)} of ${longestTakeS} seconds; ${enoughTakeS} are enough`;
  return (
    <View style={{ flexDirection: "row", alignItems: "center", gap: 12 }}>
      <Text variant="small" tone="soft" style={{ width: 44 }}>
        Time
      </Text>
      <View
        role="img"
        aria-label={words}
        style={{ flexGrow: 1, flexShrink: 1, height: 8, borderRadius: 4, borderWidth: 1, borderColor: mixtures.rungC }}
      >
        <View
          style={{
            position: "absolute",
            top: -1,
            bottom: -1,
            left: -1,
            width: `${(100 * seconds) / longestTakeS}%`,
            borderRadius: 4,
            backgroundColor: colors.plum,
          }}
        />
        <View
          style={{
            position: "absolute",
            top: -6,
            bottom: -6,
            left: `${(100 * enoughTakeS) / longestTakeS}%`,
            width: 2,
            borderRadius: 1,
            backgroundColor: colors.ink,
          }}
        />
      </View>
      <Text variant="small" style={{ fontWeight: "600", width: 64, textAlign: "right" }} testID="take-seconds">
        {`${Math.floor(seconds)} s`}
      </Text>
    </View>
  );
}
