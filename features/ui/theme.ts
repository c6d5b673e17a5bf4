/** Colours of both schemes as plain hex values; pages use them through the custom properties of `themeCss`. */
export const tokens = {
  morning: {
    paper: "#FBF6EC",
    card: "#FFFFFF",
    ink: "#241C33",
    inkSoft: "#5D5370",
    line: "#E3DACB",
    plum: "#6A2C70",
    onPlum: "#FFFFFF",
    lagoon: "#1F7A74",
    honey: "#B9770E",
    honeyText: "#8A5A08",
    brick: "#A63A2B",
  },
  lamplight: {
    paper: "#17131F",
    card: "#221C2D",
    ink: "#F3ECDF",
    inkSoft: "#B9AEC9",
    line: "#3A3148",
    plum: "#D79AE0",
    onPlum: "#17131F",
    lagoon: "#63CFC4",
    honey: "#F0BE5A",
    honeyText: "#F0BE5A",
    brick: "#FF9C8B",
  },
} as const;

export type Scheme = keyof typeof tokens;
export type ColorName = keyof (typeof tokens)["morning"];

const names = Object.keys(tokens.morning) as ColorName[];

/** Each colour as a reference to its custom property, so that a change of scheme needs no new render. */
export const colors = Object.fromEntries(names.map((name) => [name, `var(--${name})`])) as Record<ColorName, string>;

/** Mixtures that the pictures use beside the plain colours. */
export const mixtures = {
  soft: "var(--soft)",
  tint: "var(--tint)",
  warm: "var(--warm)",
  band: "var(--band)",
  rungC: "var(--rungC)",
  selected: "var(--selected)",
  /** keys of a piano: the white ones are the lighter at any hour */
  whiteKey: "var(--whiteKey)",
  blackKey: "var(--blackKey)",
} as const;

export const fonts = {
  display: '"Bricolage Grotesque", "Noto Music", sans-serif',
  text: 'Figtree, "Noto Music", sans-serif',
  mono: '"Sometype Mono", "Noto Music", monospace',
  music: '"Noto Music"',
} as const;

export const sizes = {
  gutterPhone: 16,
  gutterWide: 32,
  rail: 96,
  railMiddle: 88,
  bar: 68,
  top: 56,
  target: 48,
  radius: 14,
  content: 1280,
  middleFrom: 600,
  wideFrom: 1024,
} as const;

/** The custom properties that a scheme sets for itself. */
function ownOf(scheme: Scheme): Record<string, string> {
  const [band, white, black] =
    scheme === "morning"
      ? ["rgba(31,122,116,.13)", "card", "ink"]
      : (["rgba(99,207,196,.13)", "line", "paper"] as const);
  return {
    ...Object.fromEntries(names.map((name) => [`--${name}`, tokens[scheme][name]])),
    ...{ "--band": band, "--whiteKey": `var(--${white})`, "--blackKey": `var(--${black})` },
  };
}

function properties(scheme: Scheme): string {
  const rules = Object.entries(ownOf(scheme)).map(([name, value]) => `${name}:${value}`);
  return `${rules.join(";")};color-scheme:${scheme === "morning" ? "light" : "dark"}`;
}

/** The colours of one scheme for a part of a page, such as the stage, which is dark at any hour. */
export function schemeStyle(scheme: Scheme): Record<string, string> {
  const mixed = derived.split(";").map((rule) => rule.trim().split(/:(.*)/s, 2) as [string, string]);
  return { ...ownOf(scheme), ...Object.fromEntries(mixed), colorScheme: scheme === "morning" ? "light" : "dark" };
}

const derived = `--soft:color-mix(in srgb,var(--plum) 8%,var(--card));
--tint:color-mix(in srgb,var(--lagoon) 10%,var(--card));
--warm:color-mix(in srgb,var(--honey) 12%,var(--card));
--selected:color-mix(in srgb,var(--plum) 9%,transparent);
--rungC:color-mix(in srgb,var(--inkSoft) 45%,var(--line))`;

/** px that the bar and a button over it may cover at the foot of the phone: what takes the focus comes to stand above. */
const footRoom = sizes.bar + 96;

/** The style sheet that every page carries: the colours of both schemes, focus, accidentals, motion, print. */
export const themeCss = `
:root{${properties("morning")};${derived}}
@media (prefers-color-scheme:dark){:root:not([data-scheme=morning]){${properties("lamplight")}}}
:root[data-scheme=lamplight]{${properties("lamplight")}}
html{background:var(--paper);-webkit-text-size-adjust:100%}
body{margin:0;background:var(--paper);color:var(--ink);font:400 16px/1.45 ${fonts.text};-webkit-font-smoothing:antialiased}
:focus-visible{outline:2px solid var(--plum);outline-offset:3px}
h1:focus-visible{outline-offset:4px;border-radius:4px}
input:focus-visible,textarea:focus-visible,select:focus-visible{outline:none}
input::placeholder,textarea::placeholder{opacity:1}
span.mu{font-family:${fonts.music};font-weight:400;font-size:1.16em;line-height:0;position:relative;top:-.14em;margin:0 .01em;-webkit-text-stroke:.022em currentColor}
span.mu.fl{top:-.09em}
span.tri{display:inline-block;width:.82em;height:.68em;overflow:hidden;text-indent:-9em;white-space:nowrap;background:currentColor;clip-path:polygon(0 0,100% 0,50% 100%)}
span.tri.up{clip-path:polygon(0 100%,100% 100%,50% 0)}
[data-mono] span.mu{display:inline-block;width:.522em;margin:0;text-align:center}
a{color:inherit;text-decoration:none}
form{margin:0}
@media (max-width:${sizes.middleFrom - 1}px){html{scroll-padding-bottom:calc(${footRoom}px + env(safe-area-inset-bottom))}}
.skip{position:absolute;left:8px;top:-80px;z-index:9;background:var(--card);color:var(--plum);font-weight:600;padding:14px 20px;border-radius:14px;border:1.5px solid var(--plum)}
.skip:focus{top:8px}
@media (hover:hover){[role=button]:not([disabled]):not([aria-disabled=true]):hover,button:not([disabled]):hover,a[data-button]:hover{filter:brightness(.94)}}
@media (prefers-reduced-motion:reduce){*,*::before,*::after{animation-duration:.01ms!important;animation-iteration-count:1!important;transition-duration:.01ms!important;scroll-behavior:auto!important}}
@media print{nav,[data-bar]{display:none!important}:root:root{${properties("morning")};--paper:#FFFFFF}}
`;
