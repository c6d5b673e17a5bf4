import { colors, fonts } from "@/features/ui/theme";
import type { RosterRow } from "@/shared/contract/studio/roster";

export interface PupilTicksProps {
  label: string;
  pupils: readonly Pick<RosterRow, "memberId" | "name">[];
  chosen: ReadonlySet<string>;
  onChosen: (chosen: ReadonlySet<string>) => void;
}

/** The pupils with a box to tick each. */
export function PupilTicks({ label, pupils, chosen, onChosen }: PupilTicksProps) {
  return (
    <fieldset style={{ border: 0, margin: 0, padding: 0, minWidth: 0 }}>
      <legend style={{ font: `600 14px/18px ${fonts.text}`, color: colors.ink, padding: 0, marginBottom: 4 }}>
        {label}
      </legend>
      <div style={{ display: "grid", gridTemplateColumns: "repeat(auto-fill,minmax(180px,1fr))", columnGap: 16 }}>
        {pupils.map(({ memberId, name }) => (
          <label key={memberId} style={{ display: "flex", alignItems: "center", gap: 10, minHeight: 48, minWidth: 0 }}>
            <Tick
              label={name}
              on={chosen.has(memberId)}
              onChange={(on) => onChosen(withOne(chosen, memberId, on))}
              testID={`tick-${memberId}`}
            />
            <span style={{ font: `400 16px/22px ${fonts.text}`, overflowWrap: "anywhere", minWidth: 0 }}>{name}</span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}

/** The same choice with one more or one less. */
function withOne(chosen: ReadonlySet<string>, id: string, on: boolean): ReadonlySet<string> {
  const next = new Set(chosen);
  if (on) next.add(id);
  else next.delete(id);
  return next;
}

interface TickProps {
  label: string;
  on: boolean;
  onChange: (on: boolean) => void;
  testID?: string;
}

/** A box to tick. */
export function Tick({ label, on, onChange, testID }: TickProps) {
  return (
    <input
      type="checkbox"
      aria-label={label}
      checked={on}
      onChange={(event) => onChange(event.target.checked)}
      data-testid={testID}
      style={{ width: 22, height: 22, flexShrink: 0, accentColor: colors.plum }}
    />
  );
}
