import { pieceTones } from "@/features/ui/pieceTones";
import { parseChord } from "@/shared/music/chord";
import { glyphs } from "@/shared/music/pitch";
import { gridHeight, gridPicture, gridWidth } from "@/shared/sheets/gridPicture";
import type { Sheet, SheetOptions } from "@/shared/sheets/sheet";
import { strokesHeight, strokesPicture } from "@/shared/sheets/strokesPicture";
import { Piece } from "./paper/Piece";

export interface SheetGridsProps {
  sheet: Sheet;
  options: SheetOptions;
}

/** The grids of a sheet beside one another, and what the right hand does. */
export function SheetGrids({ sheet: { chords, instrument, strokes }, options }: SheetGridsProps) {
  if (!instrument || options.grids === "none") return null;
  const moved = instrument.capo > 0 || instrument.retune !== 0;
  const shown = chords.filter(({ played }) => parseChord(played) !== null);
  return (
    <div style={{ display: "flex", flexWrap: "wrap", gap: "8px 4px" }} data-testid="sheet-grids">
      {shown.map((chord) => {
        const height = gridHeight(chord, instrument.strings.length);
        const words = {
          name: glyphs(options.shows === "played" ? chord.played : chord.sounding),
          sounds: options.shows === "played" && moved ? glyphs(chord.sounding) : null,
        };
        return (
          <svg key={chord.written} width={gridWidth} height={height} viewBox={`0 0 ${gridWidth} ${height}`}>
            <Piece
              piece={gridPicture(chord, words, instrument, options.leftHanded, { x: 0, y: 0 })}
              colors={pieceTones}
            />
          </svg>
        );
      })}
      {strokes && (
        <svg width={200} height={strokesHeight} viewBox={`0 0 200 ${strokesHeight}`}>
          <Piece piece={strokesPicture(strokes, { x: 0, y: 0, width: 190 })} colors={pieceTones} />
        </svg>
      )}
    </div>
  );
}
