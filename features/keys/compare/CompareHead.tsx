import { useState, type CSSProperties } from "react";
import { Icon } from "@/features/ui/Icon";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { keySignParts } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import type { KeyRow } from "../keyRows";

export interface CompareHeadProps {
  row: KeyRow;
  /** name of the radio group */
  group: string;
  on: boolean;
  onSelect: () => void;
  onUnpin: () => void;
  /** what is said of the decided key */
  mark: string | null;
}

/** Head of one key's column: its sign, its score and the reason. A press chooses it. */
export function CompareHead({ row, group, on, onSelect, onUnpin, mark }: CompareHeadProps) {
  const [focused, setFocused] = useState(false);
  const parts = keySignParts(row.key);
  return (
    <th scope="col" style={{ ...head, ...(on ? bar : null) }}>
      <label style={{ display: "block", cursor: "pointer", position: "relative", paddingRight: 28 }}>
        <input
          type="radio"
          name={group}
          checked={on}
          onChange={onSelect}
          onFocus={() => setFocused(true)}
          onBlur={() => setFocused(false)}
          aria-label={`${row.sign}, ${row.score} of 100`}
          style={{ position: "absolute", inset: 0, width: "100%", height: "100%", margin: 0, opacity: 0 }}
        />
        <span
          style={{
            display: "flex",
            flexWrap: "wrap",
            alignItems: "baseline",
            columnGap: 14,
            ...(focused ? { outline: `2px solid ${colors.plum}`, outlineOffset: 3, borderRadius: 4 } : null),
          }}
        >
          <span style={{ font: `700 36px/40px ${fonts.display}`, color: row.beyond ? colors.inkSoft : colors.ink }}>
            {setSigns(glyphs(parts.large))}
            {parts.mode !== "" && <small style={{ font: `600 15px/1 ${fonts.display}` }}>{` ${parts.mode}`}</small>}
          </span>
          <span style={{ whiteSpace: "nowrap" }}>
            <span
              style={{
                font: `600 20px/1 ${fonts.display}`,
                color: row.beyond ? colors.brick : on ? colors.lagoon : colors.ink,
              }}
            >
              {row.score}
            </span>
            <span style={{ font: `400 13px/18px ${fonts.text}`, color: colors.inkSoft }}> of 100</span>
          </span>
          {mark !== null && <strong style={{ font: `600 13px/18px ${fonts.text}`, color: colors.plum }}>{mark}</strong>}
        </span>
        <span style={{ display: "block", font: `400 14px/20px ${fonts.text}`, color: colors.inkSoft }}>
          {setSigns(row.reason)}
        </span>
        <span style={unseen}>{`, ${row.moved}`}</span>
      </label>
      <button
        type="button"
        aria-label={`Take ${row.sign} away`}
        title={`Take ${row.sign} away`}
        onClick={onUnpin}
        style={away}
        data-screen=""
      >
        <Icon name="close" size={18} />
      </button>
    </th>
  );
}

const head: CSSProperties = {
  position: "relative",
  padding: "6px 20px 10px",
  verticalAlign: "top",
  textAlign: "left",
  fontWeight: 400,
  borderBottom: `1.5px solid ${colors.ink}`,
  boxSizing: "border-box",
};
const bar: CSSProperties = {
  background: `linear-gradient(${colors.plum}, ${colors.plum}) left / 4px 100% no-repeat`,
};
const away: CSSProperties = {
  position: "absolute",
  right: 4,
  top: 4,
  width: 40,
  height: 40,
  display: "flex",
  alignItems: "center",
  justifyContent: "center",
  background: "none",
  border: 0,
  color: colors.inkSoft,
  cursor: "pointer",
};
