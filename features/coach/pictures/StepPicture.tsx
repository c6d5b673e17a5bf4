import { View } from "react-native";
import { ChordGrid } from "@/features/ui/ChordGrid";
import { glyphs } from "@/shared/music/pitch";
import { keySign } from "@/shared/music/keyWords";
import type { WhyPicture } from "@/shared/coach/whyStep";
import type { Chart } from "@/shared/songs/chart";
import { ChordTable } from "./ChordTable";
import { NeckStrip } from "./NeckStrip";
import { NumberedLines } from "./NumberedLines";
import { ScalesPicture } from "./ScalesPicture";
import { StringsPicture } from "./StringsPicture";

export interface StepPictureProps {
  picture: WhyPicture;
  chart: Chart;
}

/** What a step shows, drawn from the user's own song and instrument. */
export function StepPicture({ picture, chart }: StepPictureProps) {
  switch (picture.kind) {
    case "scales": {
      const [from, to] = picture.scales;
      return (
        <View style={{ gap: 14 }}>
          <ScalesPicture scales={picture.scales} spoken={picture.spoken} />
          {from && to && (
            <ChordTable
              chords={picture.chords}
              from={`in ${glyphs(keySign(from.key))}`}
              to={`in ${glyphs(keySign(to.key))}`}
            />
          )}
        </View>
      );
    }
    case "lines":
      return <NumberedLines chart={chart} chords={picture.chords} />;
    case "strings":
      return <StringsPicture {...picture} />;
    case "neck":
      return (
        <View style={{ gap: 14 }}>
          <NeckStrip {...picture} />
          {picture.shapes.length > 0 && (
            <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 20, rowGap: 12 }}>
              {picture.shapes.map(({ name, shape }) => (
                <ChordGrid
                  key={shape.frets.join(" ")}
                  name={name}
                  shape={shape}
                  strings={picture.instrument.strings.length}
                  leftHanded={picture.instrument.leftHanded}
                  stringNames={picture.instrument.strings.map(({ note }) => note)}
                />
              ))}
            </View>
          )}
        </View>
      );
  }
}
