import type { CSSProperties } from "react";

/** What all cells of the key table share; the first two columns stay in sight. */
export const cell: CSSProperties = { padding: 0, boxSizing: "border-box", verticalAlign: "middle" };
export const firstColumn: CSSProperties = { position: "sticky", left: 0, zIndex: 1 };
export const secondColumn: CSSProperties = { position: "sticky", left: 28, zIndex: 1 };
