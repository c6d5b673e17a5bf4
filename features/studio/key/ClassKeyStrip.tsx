import { useEffect, useRef, type ReactNode } from "react";
import { View } from "react-native";
import { KeySign } from "@/features/ui/KeySign";
import { LiveText } from "@/features/ui/LiveText";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { tonicPitchClass, type Mode } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { fitTone, fitWords } from "../assign/fitWords";
import type { ClassKey } from "../judge/judgePupils";
import { fairnessSentence, octaveSentence, squeezed, type InKey } from "./classWords";
import { xOfKey } from "./dotPlaces";
import { KeyDots } from "./KeyDots";

export interface ClassKeyStripProps {
  title: string;
  /** fairest first */
  keys: readonly ClassKey[];
  picked: ClassKey;
  onPick: (key: ClassKey) => void;
  mode: Mode;
  /** in the order of the keys' pupils */
  pupils: readonly { memberId: string; name: string }[];
  /** under the sentence: what is done with the key */
  children?: ReactNode;
}

const hardest = 3;

/** One key for all: which, how fair, every pupil in every key, and who has it hardest. */
export function ClassKeyStrip({ title, keys, picked, onPick, mode, pupils, children }: ClassKeyStripProps) {
  const wide = useLayout() === "wide";
  const region = useRef<HTMLDivElement>(null);
  useEffect(() => {
    // Where the picture is wider than the page, the picked key is brought into sight.
    const frame = region.current;
    if (frame) frame.scrollLeft = xOfKey(tonicPitchClass(picked.tonic)) - frame.clientWidth / 2;
  }, [picked.tonic]);
  const inKey = pupils.flatMap(({ memberId, name }, k): InKey[] => {
    const key = picked.pupils[k];
    return key ? [{ memberId, name, key }] : [];
  });
  const octaves = octaveSentence(inKey);
  const hard = squeezed(inKey, hardest);
  const sign = glyphs(keySign({ tonic: picked.tonic, mode }));
  return (
    <View
      testID="class-key"
      style={{
        flexDirection: wide ? "row" : "column",
        gap: wide ? 28 : 16,
        paddingVertical: 8,
        borderTopWidth: 1.5,
        borderBottomWidth: 1.5,
        borderColor: colors.ink,
        alignItems: wide ? "flex-start" : "stretch",
      }}
    >
      <View style={{ gap: 6, ...(wide ? { width: 310, flexShrink: 1 } : null) }}>
        <Text variant="tiny" tone="soft" style={{ fontWeight: "500" }}>
          {title}
        </Text>
        <View style={{ flexDirection: "row", gap: 16, alignItems: "center" }}>
          <KeySign of={{ tonic: picked.tonic, mode }} size={52} tone="plum" stacked />
          <View style={{ flexShrink: 1 }}>
            <LiveText variant="small">
              {`${fairnessSentence(picked, keys.indexOf(picked))}${octaves === "" ? "" : ` ${octaves}`}`}
            </LiveText>
          </View>
        </View>
        {children}
      </View>
      <View style={{ gap: 2, minWidth: 0, flexShrink: 1 }}>
        <Text variant="tiny" tone="soft" style={{ fontWeight: "500" }}>
          Every key, every pupil: one dot is one voice’s score. Crossed: some in reach. Open: beyond the range
        </Text>
        <div
          ref={region}
          role="region"
          aria-label="Scores in every key"
          tabIndex={wide ? undefined : 0}
          style={{ overflowX: "auto" }}
        >
          <KeyDots keys={keys} mode={mode} picked={picked} onPick={onPick} />
        </div>
      </View>
      <View style={{ flexGrow: 1, flexBasis: wide ? 220 : "auto", minWidth: 0 }}>
        <Text variant="tiny" tone="soft" style={{ fontWeight: "500", marginBottom: 4 }}>
          {hard.length === 0 ? `Nobody is squeezed in ${sign}` : `Squeezed in ${sign}, semitones`}
        </Text>
        <View role="list">
          {hard.map(({ memberId, name, key }) => (
            <View
              key={memberId}
              role="listitem"
              style={{
                flexDirection: "row",
                gap: 12,
                borderTopWidth: 1,
                borderColor: colors.line,
                paddingVertical: 4,
                alignItems: "center",
              }}
            >
              <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
                <Text variant="small" style={{ fontWeight: "600", lineHeight: 18 }}>
                  {name}
                </Text>
                <Text variant="small" tone={fitTone[key.fit]} style={{ fontSize: 13, lineHeight: 18 }}>
                  {fitWords(key)}
                </Text>
              </View>
              <Text style={{ fontFamily: fonts.display, fontWeight: "600", fontSize: 20, lineHeight: 24 }}>
                {String(Math.round(key.score))}
              </Text>
            </View>
          ))}
        </View>
      </View>
    </View>
  );
}
