import { Children, type ReactNode } from "react";

/** A stretch of text, or one sign that the text fonts do not have. */
export interface TextPart {
  text: string;
  kind: "plain" | "accidental" | "arrow";
}

const accidental = /^(?:[♯♭♮]|𝄪|𝄫)$/u;
const arrow = /^[▲▼]$/u;
const sign = /([♯♭♮▲▼]|𝄪|𝄫)/u;

/** Cuts a text at its accidentals and arrows: "F♯m" becomes "F", "♯", "m". */
export function splitSigns(text: string): TextPart[] {
  return text
    .split(sign)
    .filter((part) => part !== "")
    .map((part) => ({
      text: part,
      kind: accidental.test(part) ? "accidental" : arrow.test(part) ? "arrow" : "plain",
    }));
}

function classOf({ text, kind }: TextPart): string {
  if (kind === "arrow") return text === "▲" ? "tri up" : "tri";
  return /[♭𝄫]/u.test(text) ? "mu fl" : "mu";
}

/** The same children, every accidental in a span of its own set from the music font, every ▲ and ▼ in one that is drawn. */
export function setSigns(children: ReactNode): ReactNode {
  return Children.map(children, (child) => {
    if (typeof child !== "string" || !sign.test(child)) return child;
    return splitSigns(child).map((part, index) =>
      part.kind === "plain" ? (
        part.text
      ) : (
        <span key={index} className={classOf(part)}>
          {part.text}
        </span>
      ),
    );
  });
}
