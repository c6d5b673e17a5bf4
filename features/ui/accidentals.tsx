import { Children, type ReactNode } from "react";

/** A stretch of text, or one accidental that must come from the music font. */
export interface TextPart {
  text: string;
  accidental: boolean;
}

const accidental = /([♯♭♮]|𝄪|𝄫)/u;

/** Cuts a text at its accidentals: "F♯m" becomes "F", "♯", "m". */
export function splitAccidentals(text: string): TextPart[] {
  return text
    .split(accidental)
    .filter((part) => part !== "")
    .map((part) => ({ text: part, accidental: accidental.test(part) }));
}

/** The same children, with every accidental in a span of its own that is set from the music font. */
export function setAccidentals(children: ReactNode): ReactNode {
  return Children.map(children, (child) => {
    if (typeof child !== "string" || !accidental.test(child)) return child;
    return splitAccidentals(child).map((part, index) =>
      part.accidental ? (
        <span key={index} className={/[♭𝄫]/u.test(part.text) ? "mu fl" : "mu"}>
          {part.text}
        </span>
      ) : (
        part.text
      ),
    );
  });
}
