import type { CSSProperties } from "react";
import { colors, fonts } from "../theme";

/** A table that fills its place, its columns as wide as they are told. */
export const table: CSSProperties = {
  width: "100%",
  tableLayout: "fixed",
  borderCollapse: "separate",
  borderSpacing: 0,
  font: `400 14px/18px ${fonts.text}`,
  color: colors.ink,
};

/** A column's head over an ink line. */
export const head: CSSProperties = {
  borderBottom: `1px solid ${colors.ink}`,
  font: `500 12px/16px ${fonts.text}`,
  color: colors.inkSoft,
  textAlign: "left",
  verticalAlign: "bottom",
  padding: "0 12px 6px 0",
};

/** A head that stays at the top while the rows pass under it. */
export const stuckHead: CSSProperties = {
  ...head,
  position: "sticky",
  top: 0,
  zIndex: 2,
  background: colors.paper,
};

/** A cell over a thin line. */
export const cell: CSSProperties = {
  borderBottom: `1px solid ${colors.line}`,
  padding: "0 12px 0 0",
  verticalAlign: "middle",
  overflowWrap: "anywhere",
};
