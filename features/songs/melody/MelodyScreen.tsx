import { useState, type ReactNode } from "react";
import { View } from "react-native";
import { Tessituragram, TessituragramLegend } from "@/features/span/Tessituragram";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import type { Song } from "@/shared/contract/song";
import type { Instrument } from "@/shared/instruments/instrument";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { glyphs, noteName } from "@/shared/music/pitch";
import { isClash, useSaveSong } from "../songQueries";
import { NoteEntry } from "./entry/NoteEntry";
import { useTapTone } from "./entry/useTapTone";
import { HomeChoice } from "./HomeChoice";
import { keptTune, keptWords } from "./keptTune";
import { SingPane, type SingButton } from "./SingPane";
import { readSpan, SpanByHand } from "./SpanByHand";
import { spellingOfHome } from "./spellingOfHome";
import { TuneView } from "./TuneView";
import { useEnds } from "./useEnds";
import { useMelodyEditor } from "./useMelodyEditor";
import { useTunePlayer } from "./useTunePlayer";

export interface MelodyScreenProps {
  song: Song;
  voice: SingingVoice | null;
  instrument: Instrument;
  /** chooses another instrument for the neck */
  chooser: ReactNode;
  sing: SingButton;
  onKept: () => void;
}

type Way = "sing" | "keys" | "neck" | "ends";

/** A keyboard for a tune of which nothing is known begins here. */
const usualLow = 60;

const ways = [
  { value: "sing", label: "Sing" },
  { value: "keys", label: "Keys" },
  { value: "neck", label: "Neck" },
  { value: "ends", label: "Ends only" },
] as const;

/** The tune of a song: sung, played in on keys or on one's own neck, or only its ends; seen, heard and changed. */
export function MelodyScreen({ song, voice, instrument, chooser, sing, onKept }: MelodyScreenProps) {
  const wide = useLayout() === "wide";
  const editor = useMelodyEditor(song);
  const save = useSaveSong();
  const tone = useTapTone();
  const player = useTunePlayer(tone, editor.tempo);
  const { history, dispatch, home, proposed } = editor;
  const { notes, chosen } = history;
  const { ends, setEnds, ...endsDraft } = useEnds(song);
  const [way, setWay] = useState<Way>(() => {
    if (editor.found) return "sing";
    return endsDraft.found || song.tune?.kind === "span" ? "ends" : "sing";
  });
  const [tried, setTried] = useState(false);
  const spelling = spellingOfHome(home);
  const byEnds = way === "ends";
  const span = readSpan(ends);
  const endsToKeep = span.ok ? keptTune(song, { kind: "span", ...span }, span.home) : null;
  const toKeep = byEnds ? endsToKeep : editor.toKeep;
  const keep = () => {
    setTried(true);
    if (toKeep) save.mutate({ ...song, tune: toKeep.tune }, { onSuccess: kept });
  };
  const kept = () => {
    editor.letGo();
    endsDraft.letGo();
    onKept();
  };
  const say = (midi: number | undefined) => (midi === undefined ? "" : glyphs(noteName(midi, spelling)));
  const part = chosen && `${say(notes[chosen.from]?.midi)} to ${say(notes[chosen.to]?.midi)}`;

  const entry = (
    <View style={{ gap: 14 }}>
      <Segmented label="How the tune comes in" value={way} options={ways} onChange={setWay} testID="melody-way" />
      {way === "sing" ? (
        <SingPane sing={sing} count={notes.length} part={part} tempo={song.tempo} onSung={editor.sung} />
      ) : byEnds ? (
        <>
          <SpanByHand texts={ends} onChange={setEnds} tried={tried} />
          {notes.length > 0 && (
            <Notice kind="caution" title="The notes would go">
              The song now has a tune with all its notes. Keeping only its ends makes keys coarser.
            </Notice>
          )}
          {span.ok && endsToKeep && keptWords(song, span.home, endsToKeep.move) !== null && (
            <Text variant="small">{keptWords(song, span.home, endsToKeep.move)}</Text>
          )}
        </>
      ) : (
        <NoteEntry
          on={way}
          instrument={instrument}
          chooser={chooser}
          from={12 * Math.floor((notes.length > 0 ? Math.min(...notes.map(({ midi }) => midi)) : usualLow) / 12)}
          onNote={(note) => {
            tone().play(note.midi);
            editor.enter(note);
          }}
        />
      )}
    </View>
  );
  const tune = byEnds ? null : notes.length === 0 ? (
    <Text tone="soft">No notes yet. Here they will stand as a picture over your voice and as a list to change.</Text>
  ) : (
    <TuneView
      history={history}
      dispatch={dispatch}
      home={home}
      spelling={spelling}
      voice={voice}
      sounding={player.at}
      onPlay={() => (player.at === null ? player.play(notes, chosen?.from ?? 0) : player.stop())}
    />
  );
  const hasNotes = !byEnds && notes.length > 0;
  const rest = hasNotes && (
    <HomeChoice home={home} proposed={proposed} onChange={editor.setHome} kept={editor.movedWords} />
  );
  const place = hasNotes && (
    <View style={{ gap: 8 }}>
      <Heading level={2}>Where it lies</Heading>
      <Tessituragram notes={notes} home={home} voice={voice} spelling={spelling} testID="tessituragram" />
      <TessituragramLegend />
    </View>
  );
  return (
    <Screen
      title="Melody"
      subtitle={wide ? null : song.title}
      crumb={{ label: song.title, href: { pathname: "/songs/[id]", params: { id: song.id } } }}
      wide
      footer={
        <Button
          small={wide}
          label={byEnds ? "Keep these ends" : "Keep this tune"}
          busy={save.isPending}
          disabled={!byEnds && notes.length === 0}
          onPress={keep}
          testID="keep-melody"
        />
      }
    >
      {save.error && (
        <Notice kind="error" title="The tune is not kept yet">
          {isClash(save.error)
            ? `${save.error.message} Your notes are still here. Keep them again to put them in; what stands there now stays in the earlier versions.`
            : `${save.error.message} Its notes are still here.`}
        </Notice>
      )}
      {(byEnds ? endsDraft : editor).found && (
        <Notice
          kind="good"
          testID={byEnds ? "ends-restored" : "notes-restored"}
          title={byEnds ? "Your ends are back" : "Your notes are back"}
          action={
            <Button
              kind="text"
              small
              label="Give them up"
              onPress={(byEnds ? endsDraft : editor).giveUp}
              testID={byEnds ? "ends-give-up" : "notes-give-up"}
            />
          }
        >
          {byEnds
            ? "What you wrote and did not keep stands here again."
            : "What you sang or entered and did not keep stands here again."}
        </Notice>
      )}
      {wide ? (
        <View
          style={webStyle({
            display: "grid",
            // The same elements in either place, so that the first note takes no focus away.
            gridTemplateColumns: hasNotes ? "minmax(0, 1fr) minmax(340px, 440px)" : "minmax(0, 560px) minmax(0, 1fr)",
            columnGap: 40,
            alignItems: "start",
            borderTop: `1.5px solid ${colors.ink}`,
            paddingTop: 20,
          })}
        >
          <View style={webStyle({ gap: 24, gridRow: 1, gridColumn: hasNotes ? 1 : 2 })}>{tune}</View>
          <View style={webStyle({ gap: 28, gridRow: 1, gridColumn: hasNotes ? 2 : 1 })}>
            {entry}
            {rest}
            {place}
          </View>
        </View>
      ) : (
        <View style={{ gap: 24, paddingTop: 12 }}>
          {entry}
          {rest}
          {tune}
          {place}
        </View>
      )}
    </Screen>
  );
}
