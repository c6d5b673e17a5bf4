import { useEffect, useRef, type RefObject } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import type { PhraseMeasures } from "@/shared/keys/takeMeasures";
import type { PlannedNote } from "@/shared/songs/backing/backingPlan";
import { MeasureList } from "./MeasureList";
import { PhrasePicture } from "./PhrasePicture";
import type { SungPicture } from "./sungPicture";
import type { TryRecorder } from "../singing/tryRecorder";

export interface PhraseRowProps {
  phrase: PhraseMeasures;
  number: number;
  notes: readonly PlannedNote[];
  picture: SungPicture;
  spelling: "sharps" | "flats";
  playback: TryRecorder["playback"];
}

const pictureHeight = 84;
const picturesRight = 34;

/** A phrase as it was sung: its picture, its sentence, its figures, and its sound. */
export function PhraseRow({ phrase, number, notes, picture, spelling, playback }: PhraseRowProps) {
  const wide = useLayout() === "wide";
  const cursor = useRef<View>(null);
  const { start, end } = phrase;
  useCursor(cursor, playback, start, end);
  const name = phrase.label ?? `Phrase ${number}`;
  return (
    <View
      testID={`try-phrase-${number}`}
      style={{ borderTopWidth: 1, borderColor: colors.line, paddingVertical: 8, gap: 4 }}
    >
      <View
        style={{ flexDirection: "row", alignItems: "center", justifyContent: "space-between", gap: 12, minHeight: 48 }}
      >
        <Text variant="strong" style={{ flexShrink: 1 }}>
          {name}
        </Text>
        {start !== null && end !== null && (
          <Button
            kind="text"
            small
            icon="play"
            label="Hear it"
            accessibleName={`Hear it: ${name}`}
            onPress={() => void playback.play({ startS: Math.max(0, start - 0.2), endS: end + 0.3 })}
          />
        )}
      </View>
      <View style={{ flexDirection: wide ? "row" : "column", gap: wide ? 24 : 8 }}>
        <View style={wide ? { width: 380 } : null}>
          {start !== null && end !== null && (
            <View>
              <PhrasePicture
                phrase={phrase}
                notes={notes}
                picture={picture}
                spelling={spelling}
                start={start}
                end={end}
                height={pictureHeight}
              />
              <View style={{ position: "absolute", top: 0, bottom: 0, left: 0, right: picturesRight }}>
                <View
                  ref={cursor}
                  style={{
                    position: "absolute",
                    top: 0,
                    bottom: 0,
                    width: 2,
                    opacity: 0,
                    backgroundColor: colors.plum,
                  }}
                />
              </View>
            </View>
          )}
        </View>
        <View style={{ flexGrow: 1, flexShrink: 1, gap: 6 }}>
          <Text>{phrase.sentence}</Text>
          {!phrase.leftOut && <MeasureList measures={phrase} spelling={spelling} />}
        </View>
      </View>
    </View>
  );
}

/** Moves a line over the picture with what is played. */
function useCursor(
  cursor: RefObject<View | null>,
  { playing, position }: TryRecorder["playback"],
  start: number | null,
  end: number | null,
) {
  useEffect(() => {
    const element = cursor.current as unknown as HTMLElement | null;
    if (!playing || start === null || end === null || !element) return;
    let frame = requestAnimationFrame(function look() {
      frame = requestAnimationFrame(look);
      const share = (position() - start) / (end - start);
      element.style.opacity = share < 0 || share > 1 ? "0" : "1";
      element.style.left = `${(100 * Math.min(1, Math.max(0, share))).toFixed(2)}%`;
    });
    return () => {
      cancelAnimationFrame(frame);
      element.style.opacity = "0";
    };
  }, [cursor, playing, position, start, end]);
}
