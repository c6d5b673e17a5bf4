import { useState, type ReactNode } from "react";
import { View } from "react-native";
import type { Scale } from "@/features/span/ladderGeometry";
import { SpanBar } from "@/features/span/SpanBar";
import { sungIn } from "@/features/span/sungSpan";
import { Button } from "@/features/ui/Button";
import { Dialog } from "@/features/ui/Dialog";
import { Field } from "@/features/ui/Field";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { fonts } from "@/features/ui/theme";
import { glyphs, noteName } from "@/shared/music/pitch";
import { Tick } from "../PupilTicks";
import { bandWords, pictureVoice, silence } from "../roster/rosterWords";
import { fitTone, fitWords } from "./fitWords";
import type { PartCellProps } from "./assignRows";
import { partWay, wayMark, type PupilPart } from "./pupilParts";

const note = (midi: number) => glyphs(noteName(Math.round(midi)));

/** The pupil's voice with the song in it, in the key that stands beside. */
export function PartBand({ part, scale, width }: { part: PupilPart; scale: Scale; width: number }) {
  const { row, key } = part;
  const voice = pictureVoice(row);
  if (!voice)
    return (
      <Text variant="small" tone="soft">
        {silence(row) ?? "no voice measured yet"}
      </Text>
    );
  const { judged } = key;
  const span = judged && sungIn(judged.lowMidi, judged.highMidi, voice);
  const words = `${bandWords({ ...row, open: [] })}${judged ? `. The song from ${note(judged.lowMidi)} to ${note(judged.highMidi)}` : ""}`;
  return <SpanBar tall voice={voice} span={span} scale={scale} width={width} words={words} />;
}

/** The key of one pupil, to be changed. */
export function PartKey({ part, onDraft }: Omit<PartCellProps, "ways">) {
  const { row, options, key } = part;
  return (
    <Select
      inline
      alone
      label={`Key for ${row.name}`}
      options={options.map(({ shift, label }) => ({ value: String(shift), label }))}
      value={String(key.shift)}
      onChange={(shift) => onDraft(row.memberId, { shift: Number(shift), way: null })}
      testID={`key-${row.memberId}`}
    />
  );
}

/** A key and how the song lies in it, beside each other where there is room. */
export function KeyLine({ children }: { children: ReactNode }) {
  return (
    <View
      style={{
        ...{ flexDirection: "row", flexWrap: "wrap", columnGap: 16, minHeight: 48 },
        ...{ alignItems: "center", alignContent: "center" },
      }}
    >
      {children}
    </View>
  );
}

/** How the song lies in that key. */
export function PartFit({ part: { key } }: { part: PupilPart }) {
  if (!key.judged)
    return (
      <Text variant="small" tone="soft">
        not judged
      </Text>
    );
  return (
    <Text variant="small" tone={fitTone[key.judged.fit]}>
      {fitWords(key.judged)}
    </Text>
  );
}

/** The way of one pupil on their own instrument, to be changed. */
export function PartWay({ part, ways, onDraft }: PartCellProps) {
  const { row, draft, instrument } = part;
  if (!instrument)
    return (
      <Text variant="small" tone="soft">
        no instrument yet: the pupil chooses
      </Text>
    );
  if (!draft.chosen) return null;
  const chosen = partWay(part, ways);
  if (!ways || !chosen)
    return (
      <Text variant="small" tone="soft">
        {ways === undefined ? `looking for ways on ${instrument.name}` : `no way found on ${instrument.name}`}
      </Text>
    );
  return (
    <View style={{ alignItems: "flex-start", minWidth: 0 }}>
      <Select
        inline
        alone
        label={`Way for ${row.name}`}
        options={ways.map((way) => ({ value: wayMark(way), label: glyphs(way.title) }))}
        value={wayMark(chosen)}
        onChange={(way) => onDraft(row.memberId, { way })}
        testID={`way-${row.memberId}`}
      />
      <Text variant="tiny" tone="soft">
        {instrument.name}
      </Text>
    </View>
  );
}

/** A note to one pupil, written in a sheet over the page. */
export function PartNote({ part: { row, draft }, onDraft }: Omit<PartCellProps, "ways">) {
  const [open, setOpen] = useState(false);
  const [text, setText] = useState(draft.note);
  const done = () => {
    onDraft(row.memberId, { note: text });
    setOpen(false);
  };
  return (
    <>
      <Button
        kind="text"
        small
        label={draft.note === "" ? "Note" : "Note ✓"}
        accessibleName={draft.note === "" ? `Note to ${row.name}` : `Note ✓ to ${row.name}`}
        onPress={() => setOpen(true)}
        testID={`note-${row.memberId}`}
      />
      {open && (
        <Dialog title={`Note to ${row.name}`} onClose={done}>
          <Field label="Only for this pupil" value={text} onChangeText={setText} multiline rows={4} autoFocus />
          <Button label="Done" onPress={done} />
        </Dialog>
      )}
    </>
  );
}

/** Whether a pupil gets the song. */
export function GiveTick({ part: { row, draft }, onDraft }: Omit<PartCellProps, "ways">) {
  return (
    <label style={{ display: "flex", width: 48, height: 48, alignItems: "center" }}>
      <Tick
        label={`Give it to ${row.name}`}
        on={draft.chosen}
        onChange={(chosen) => onDraft(row.memberId, { chosen })}
        testID={`give-${row.memberId}`}
      />
    </label>
  );
}

/** The score in a key that is the same for all. */
export function OneKey({ part: { key } }: { part: PupilPart }) {
  return (
    <Text variant="strong" style={{ fontFamily: fonts.display }}>
      {key.judged ? String(Math.round(key.judged.score)) : "–"}
    </Text>
  );
}
