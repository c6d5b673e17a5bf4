import type { CSSProperties } from "react";

/**
 * A style that only the web knows (sticky places, `em` lengths, grids), for a React Native component.
 * React Native's own types leave these out, the web renderer passes them on.
 */
export function webStyle(style: CSSProperties): object {
  return style;
}

/** Attributes that the web renderer passes on and React Native's types leave out. */
export function webProps(attributes: Record<string, unknown>): object {
  return attributes;
}
