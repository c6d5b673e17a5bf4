import { useState, type ReactNode } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Segmented } from "@/features/ui/Segmented";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import type { TakeReport } from "@/shared/voice/takeReport";
import { spellTonic, tonicPitchClass, type KeyName } from "@/shared/music/keyName";
import { glyphs, pitchClass } from "@/shared/music/pitch";
import { proposeHome, sungMelody } from "@/shared/songs/sungMelody";
import { tonics } from "../editor/keyChoice";
import { SmallKeyboard } from "@/features/ui/notes/SmallKeyboard";
import { useTapTone } from "../melody/entry/useTapTone";
import type { Listening, ListeningEvent } from "./listening";

/** The two ways that need the microphone, as the page that joins voice and songs gives them. */
export interface HomeEars {
  hum: (way: { label: string; onHummed: (midi: number) => void }) => ReactNode;
  sing: (way: { label: string; onSung: (report: TakeReport) => void }) => ReactNode;
}

export interface HomeStepProps extends HomeEars {
  state: Listening;
  dispatch: (event: ListeningEvent) => void;
  /** the chart's key, for the spelling */
  chart: KeyName | null;
}

type Way = "hum" | "sing" | "tap" | "name";
const ways = [
  { value: "hum", label: "Hum it" },
  { value: "sing", label: "Sing a line" },
  { value: "tap", label: "Tap it" },
  { value: "name", label: "Name it" },
] as const;

/** Step 3: the note the song comes home to, hummed, sung, tapped on keys with sound, or named. */
export function HomeStep({ state, dispatch, chart, hum, sing }: HomeStepProps) {
  const [way, setWay] = useState<Way>("hum");
  const [unheard, setUnheard] = useState("");
  const tone = useTapTone();
  const { home } = state;
  const third = chart?.mode ?? "major";
  const set = (found: Listening["home"]) => {
    setUnheard("");
    dispatch({ kind: "home", home: found });
  };
  const heard = (midi: number, from: "hummed" | "tapped") =>
    set({ tonic: spellTonic(pitchClass(midi), third), mode: null, from, why: `You ${from} it.` });
  const sung = (report: TakeReport) => {
    const found = proposeHome(sungMelody(report));
    if (found) set({ tonic: found.tonic, mode: found.mode, from: "sung", why: found.reasons.join(" ") });
    else setUnheard("Too few notes to tell. Sing the last line of the song, up to the note it ends on.");
  };
  return (
    <View style={{ gap: 16 }}>
      <Text>
        Listen for the note on which the song could end: the one that feels like home. In which octave you find it does
        not matter.
      </Text>
      <Segmented label="How you find the home note" value={way} options={ways} onChange={setWay} testID="home-way" />
      {way === "hum" && (
        <View style={{ gap: 8 }}>
          <Text variant="small" tone="soft">
            Stop the recording on that note if you can, press, and hum the note until it is taken. Headphones keep the
            recording out of the microphone.
          </Text>
          {hum({ label: "Hum the home note", onHummed: (midi) => heard(midi, "hummed") })}
        </View>
      )}
      {way === "sing" && (
        <View style={{ gap: 8 }}>
          <Text variant="small" tone="soft">
            Sing a line along with the recording, best the last one, without stopping on the way.
          </Text>
          {sing({ label: "Sing a line of it", onSung: sung })}
        </View>
      )}
      {way === "tap" && (
        <View style={{ gap: 8 }}>
          <Text variant="small" tone="soft">
            Tap keys while the recording plays until one agrees with it from beginning to end. The last one counts.
          </Text>
          <SmallKeyboard
            label="Keys for the home note"
            from={60}
            octaves={1}
            testID="home-keyboard"
            onNote={(midi) => {
              tone().play(midi, 1.2);
              heard(midi, "tapped");
            }}
          />
        </View>
      )}
      {way === "name" && (
        <Select
          label="Home note of the recording"
          value={home?.tonic ?? ""}
          testID="home-named"
          options={[{ value: "", label: "Choose" }, ...tonics.map((tonic) => ({ value: tonic, label: glyphs(tonic) }))]}
          onChange={(tonic) =>
            set(tonic === "" ? null : { tonic, mode: home?.mode ?? null, from: "named", why: "You named it." })
          }
        />
      )}
      <LiveText variant="strong" testID="home-found">
        {unheard !== "" ? unheard : home ? `Home note of the recording: ${glyphs(home.tonic)}.` : "No home note yet."}
      </LiveText>
      {home && (
        <View style={{ gap: 12 }}>
          <Text variant="small" tone="soft">
            {home.why}
          </Text>
          <Button
            kind="secondary"
            small
            icon="play"
            label={`Hear ${glyphs(home.tonic)}`}
            onPress={() => tone().play(60 + tonicPitchClass(home.tonic), 1.6)}
            style={{ alignSelf: "flex-start" }}
          />
          <Segmented
            label="How the recording sounds"
            testID="home-mode"
            value={home.mode === null ? "unknown" : home.mode === "minor" ? "minor" : "major"}
            options={[
              { value: "unknown", label: "Not sure" },
              { value: "major", label: "Bright, major" },
              { value: "minor", label: "Dark, minor" },
            ]}
            onChange={(mode) => dispatch({ kind: "home", home: { ...home, mode: mode === "unknown" ? null : mode } })}
          />
        </View>
      )}
    </View>
  );
}
