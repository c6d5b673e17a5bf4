import { useEffect, useMemo, useRef, useState, type ReactNode } from "react";
import { Pressable, View, type Text as NativeText } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webProps, webStyle } from "@/features/ui/webStyle";
import { retuned } from "@/shared/coach/tunedNeck";
import { whyTitle, whyWalk, type WhyQuestion } from "@/shared/coach/whyWalk";
import type { LeftOut, WhyStep } from "@/shared/coach/whyStep";
import { StepPicture } from "./pictures/StepPicture";
import { QuestionPane } from "./QuestionPane";
import { stepAfterKey } from "./stepAfterKey";
import { StepProgress } from "./StepProgress";

export interface WhyScreenProps {
  song: { id: string; title: string };
  /** what is explained; its seed decides the first questions */
  asked: WhyQuestion;
  /** what the way does, such as "Capo 3, shapes in A, on the box guitar" */
  way: string;
  /** the step to begin with */
  step: string | undefined;
  onStep: (kind: WhyStep["kind"]) => void;
  /** where the ways into this key stand */
  waysHref: { pathname: "/songs/[id]/ways"; params: { id: string; key: string; shift: string } };
}

/** The walk: one step a screen on the phone; on wide screens all steps in a column, the open one's picture beside it. */
export function WhyScreen({ song, asked, way, step, onStep, waysHref }: WhyScreenProps) {
  const wide = useLayout() === "wide";
  const [more, setMore] = useState(0);
  const { steps, leftOut } = useWalk(asked, more);
  const at = Math.max(
    0,
    steps.findIndex(({ kind }) => kind === step),
  );
  const open = steps[at]!;
  const heading = useRef<NativeText>(null);
  const shown = useRef(open.kind);
  useEffect(() => {
    if (shown.current === open.kind) return;
    shown.current = open.kind;
    heading.current?.focus();
    if (!wide) window.scrollTo({ top: 0 });
  }, [open.kind, wide]);
  const go = (to: number) => {
    const next = steps[to];
    if (next) onStep(next.kind);
  };
  const onKeyDown = (event: { key: string; target?: unknown; preventDefault: () => void }) => {
    const to = stepAfterKey(event, at, steps.length);
    if (to === null) return;
    event.preventDefault();
    go(to);
  };
  const question = (
    <QuestionPane
      key={`${open.kind} ${more}`}
      question={open.question}
      instrument={retuned(asked.instrument, asked.way.retune, asked.to)}
      onAnother={() => setMore(more + 1)}
    />
  );
  const words = (
    <View style={{ gap: 10 }}>
      {open.words.map((sentence) => (
        <Text key={sentence}>{sentence}</Text>
      ))}
    </View>
  );
  const title = (
    <Heading ref={heading} level={2} focusable>
      {open.title}
    </Heading>
  );
  const picture = <StepPicture picture={open.picture} chart={asked.chart} />;
  const moves = (
    <View style={{ flexDirection: "row", gap: 10 }}>
      <Button
        kind="secondary"
        small
        label="Back"
        icon="back"
        disabled={at === 0}
        onPress={() => go(at - 1)}
        testID="step-back"
        style={wide ? null : { flexGrow: 1 }}
      />
      {at < steps.length - 1 ? (
        <Button
          small
          label="Next"
          onPress={() => go(at + 1)}
          testID="step-next"
          style={wide ? null : { flexGrow: 2 }}
        />
      ) : (
        <LinkButton
          small
          href={waysHref}
          label="To the ways"
          testID="step-ways"
          style={wide ? null : { flexGrow: 2 }}
        />
      )}
    </View>
  );
  return (
    <Screen
      title={whyTitle(asked.to)}
      subtitle={way}
      crumb={{ label: song.title, href: { pathname: "/songs/[id]", params: { id: song.id } } }}
      wide
      footer={wide ? undefined : moves}
    >
      <View {...webProps({ onKeyDown })} testID="why-walk">
        {wide ? (
          <View style={{ flexDirection: "row", gap: 48, alignItems: "flex-start" }}>
            <View role="list" style={{ width: 520, flexShrink: 1 }}>
              {steps.map((each, index) => (
                <View key={each.kind} role="listitem" style={{ borderTopWidth: 1, borderColor: colors.line }}>
                  {index === at ? (
                    <View style={{ paddingVertical: 16, gap: 12 }}>
                      <StepHead number={index + 1}>{title}</StepHead>
                      {words}
                      {question}
                      {moves}
                    </View>
                  ) : (
                    <Pressable
                      role="button"
                      onPress={() => go(index)}
                      testID={`step-${each.kind}`}
                      style={{ minHeight: 52, justifyContent: "center" }}
                    >
                      <StepHead number={index + 1}>
                        <Text variant="strong">{each.title}</Text>
                      </StepHead>
                    </Pressable>
                  )}
                </View>
              ))}
              <LeftOutList leftOut={leftOut} />
            </View>
            <Card
              style={[
                { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0, padding: 24 },
                webStyle({ position: "sticky", top: 24 }),
              ]}
            >
              {picture}
            </Card>
          </View>
        ) : (
          <View style={{ gap: 14 }}>
            <StepProgress at={at} count={steps.length} />
            {title}
            <Card>{picture}</Card>
            {words}
            {question}
            {at === steps.length - 1 && <LeftOutList leftOut={leftOut} />}
          </View>
        )}
      </View>
    </Screen>
  );
}

/** The walk, worked out anew only where what is asked has changed: a long neck takes a moment. */
function useWalk(asked: WhyQuestion, more: number) {
  const { chart, ...rest } = asked;
  const facts = JSON.stringify(rest);
  return useMemo(() => {
    const question = JSON.parse(facts) as Omit<WhyQuestion, "chart">;
    return whyWalk({ chart, ...question, seed: question.seed + more });
  }, [chart, facts, more]);
}

function StepHead({ number, children }: { number: number; children: ReactNode }) {
  return (
    <View style={{ flexDirection: "row", gap: 12, alignItems: "baseline" }}>
      <Text tone="soft" style={{ fontFamily: fonts.display, fontWeight: "600", fontSize: 16, width: 16 }}>
        {number}
      </Text>
      <View style={{ flexShrink: 1 }}>{children}</View>
    </View>
  );
}

/** What the walk passes over, and why. */
function LeftOutList({ leftOut }: { leftOut: readonly LeftOut[] }) {
  if (leftOut.length === 0) return null;
  return (
    <View testID="left-out" style={{ borderTopWidth: 1, borderColor: colors.line, paddingTop: 12, gap: 6 }}>
      <Text variant="label" tone="soft">
        Not in this walk
      </Text>
      {leftOut.map(({ title, why }) => (
        <Text key={title} variant="small" tone="soft">
          {`${title}: ${why.charAt(0).toLowerCase()}${why.slice(1)}`}
        </Text>
      ))}
    </View>
  );
}
