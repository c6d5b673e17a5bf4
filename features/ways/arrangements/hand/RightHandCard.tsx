import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Select } from "@/features/ui/Select";
import { StrokeLine } from "@/features/ui/StrokeLine";
import { Text } from "@/features/ui/Text";
import { useState } from "react";
import { sheetStrokes } from "@/shared/sheets/sheetStrokes";
import type { Metre } from "@/shared/songs/backing/metre";
import { commonPatterns, type Step, type StrokePattern } from "@/shared/ways/hand/strokePattern";
import { PatternGrid } from "./PatternGrid";

export interface RightHandCardProps {
  pattern: StrokePattern;
  metre: Metre;
  onChange: (pattern: StrokePattern) => void;
}

const own = "Your own pattern";

/** What the right hand does in a bar: one of the usual patterns, or one's own, stroke by stroke. */
export function RightHandCard({ pattern, metre, onChange }: RightHandCardProps) {
  const [open, setOpen] = useState(false);
  const usual = commonPatterns(metre);
  const same = usual.find(({ steps }) => steps.join() === pattern.steps.join());
  const options = [
    ...usual.map(({ name }) => ({ value: name, label: name })),
    ...(same ? [] : [{ value: own, label: pattern.name === "" ? own : pattern.name }]),
  ];
  const change = (steps: Step[]) => {
    const known = usual.find((each) => each.steps.join() === steps.join());
    onChange(known ?? { ...pattern, name: own, steps });
  };
  return (
    <Card style={{ gap: 14 }} testID="right-hand">
      <Heading level={2}>Right hand</Heading>
      <Select
        label={`Pattern in ${metre.name}`}
        options={options}
        value={same?.name ?? own}
        onChange={(name) => {
          const chosen = usual.find((each) => each.name === name);
          if (chosen) onChange(chosen);
        }}
        testID="pattern"
      />
      <StrokeLine strokes={sheetStrokes(pattern, metre)} width={280} />
      <Text variant="tiny" tone="soft">
        Arrows are strokes down and up, a dot is the bass string, a ring a single plucked string.
      </Text>
      <Button
        kind="text"
        small
        label={open ? "Close the bar" : "Change the bar"}
        icon={open ? "up" : "down"}
        expanded={open}
        onPress={() => setOpen(!open)}
        testID="change-pattern"
        flush
      />
      {open && <PatternGrid steps={pattern.steps} metre={metre} onChange={change} />}
    </Card>
  );
}
