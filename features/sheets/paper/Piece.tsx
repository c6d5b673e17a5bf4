import { fonts } from "@/features/ui/theme";
import type { SheetFace, SheetPiece, SheetText, SheetTone } from "@/shared/sheets/sheetPiece";

const faces: Record<SheetFace, { family: string; weight: number }> = {
  mono: { family: fonts.mono, weight: 400 },
  monoBold: { family: fonts.mono, weight: 600 },
  title: { family: fonts.display, weight: 700 },
  text: { family: fonts.text, weight: 400 },
  textBold: { family: fonts.text, weight: 600 },
};

/** One piece of a sheet, drawn where it was laid. */
export function Piece({ piece, colors }: { piece: SheetPiece; colors: Readonly<Record<SheetTone, string>> }) {
  switch (piece.kind) {
    case "text":
      return <Words piece={piece} color={colors[piece.tone]} />;
    case "line": {
      const { kind: _kind, tone, width, ...ends } = piece;
      return <line {...ends} stroke={colors[tone]} strokeWidth={width} strokeLinecap="round" />;
    }
    case "box": {
      const { x, y, width, height, radius, tone } = piece;
      return <rect {...{ x, y, width, height }} rx={radius} fill={colors[tone]} />;
    }
    case "dot": {
      const { x, y, radius, stroke, tone } = piece;
      return stroke === null ? (
        <circle cx={x} cy={y} r={radius} fill={colors[tone]} />
      ) : (
        <circle cx={x} cy={y} r={radius} fill="none" stroke={colors[tone]} strokeWidth={stroke} />
      );
    }
    case "picture":
      return (
        <g
          data-picture={piece.what}
          {...(piece.words === "" ? { "aria-hidden": true } : { role: "img", "aria-label": piece.words })}
        >
          {piece.pieces.map((part, index) => (
            <Piece key={index} piece={part} colors={colors} />
          ))}
        </g>
      );
  }
}

function Words({ piece: { runs, face, role }, color }: { piece: SheetText; color: string }) {
  const { family, weight } = faces[face];
  const heading = role === "plain" ? null : { role: "heading", "aria-level": role === "title" ? 2 : 3 };
  return (
    <text
      {...heading}
      fill={color}
      fontFamily={family}
      fontWeight={weight}
      style={{ whiteSpace: "pre", textRendering: "geometricPrecision", fontKerning: "none" }}
    >
      {runs.map(({ text, x, y, size, music }, index) => (
        <tspan
          key={index}
          {...{ x, y }}
          fontSize={size}
          {...(music ? { fontFamily: fonts.music, fontWeight: 400 } : null)}
        >
          {text}
        </tspan>
      ))}
    </text>
  );
}
