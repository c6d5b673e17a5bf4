import type { CSSProperties } from "react";

/** Out of sight, not out of hearing: words for screen readers only. */
export const unseen: CSSProperties = {
  position: "absolute",
  width: 1,
  height: 1,
  margin: -1,
  overflow: "hidden",
  clipPath: "inset(50%)",
  whiteSpace: "nowrap",
};
