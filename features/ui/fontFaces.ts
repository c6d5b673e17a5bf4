import bricolage600 from "@/fonts/bricolage-grotesque-latin-600-normal.woff2";
import bricolage700 from "@/fonts/bricolage-grotesque-latin-700-normal.woff2";
import figtree400 from "@/fonts/figtree-latin-400-normal.woff2";
import figtree500 from "@/fonts/figtree-latin-500-normal.woff2";
import figtree600 from "@/fonts/figtree-latin-600-normal.woff2";
import music400 from "@/fonts/noto-music-music-400-normal.woff2";
import mono400 from "@/fonts/sometype-mono-latin-400-normal.woff2";
import mono600 from "@/fonts/sometype-mono-latin-600-normal.woff2";

/** Where the bundler put a font: its address, or an object that holds it. */
type FontAsset = string | { uri: string };

interface Face {
  family: string;
  weight: number;
  asset: FontAsset;
  range?: string;
}

/** ♭ ♮ ♯ 𝄪 𝄫: none of the three text families has them. */
export const musicRange = "U+266D-266F,U+1D12A-1D12B";

const faces: readonly Face[] = [
  { family: "Bricolage Grotesque", weight: 600, asset: bricolage600 },
  { family: "Bricolage Grotesque", weight: 700, asset: bricolage700 },
  { family: "Figtree", weight: 400, asset: figtree400 },
  { family: "Figtree", weight: 500, asset: figtree500 },
  { family: "Figtree", weight: 600, asset: figtree600 },
  { family: "Sometype Mono", weight: 400, asset: mono400 },
  { family: "Sometype Mono", weight: 600, asset: mono600 },
  { family: "Noto Music", weight: 400, asset: music400, range: musicRange },
];

/** The @font-face rules of every shipped face. */
export function fontFaceCss(): string {
  return faces
    .map(({ family, weight, asset, range }) => {
      const address = typeof asset === "string" ? asset : asset.uri;
      const limit = range === undefined ? "" : `unicode-range:${range};`;
      return `@font-face{font-family:"${family}";font-weight:${weight};font-display:swap;${limit}src:url("${address}") format("woff2")}`;
    })
    .join("\n");
}
