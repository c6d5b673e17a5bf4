import type { CSSProperties } from "react";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { spellingIn, type KeyRow } from "../keyRows";
import { TryLink } from "../tryout/TryLink";
import type { KnownTry } from "../tryout/tryQueries";
import { takeDay, takeInWords, takesSummary } from "./takesWords";

export interface TakesTriedProps {
  songId: string;
  row: KeyRow;
  /** what was sung in this key, newest first; undefined while it is fetched */
  takes: readonly KnownTry[] | undefined;
  /** why that is not known; null where it is */
  fault: Error | null;
}

const mostShown = 2;

/** What was sung in one key: how often, how well at best, and how the newest of it felt. */
export function TakesTried({ songId, row, takes, fault }: TakesTriedProps) {
  if (!takes) return <span style={soft}>{fault ? `Not known. ${fault.message}` : "Looking for your tries"}</span>;
  const more = takes.length - mostShown;
  return (
    <div style={{ display: "flex", flexDirection: "column", rowGap: 2 }}>
      {takes.length === 0 ? (
        <span style={soft}>Not sung yet.</span>
      ) : (
        <>
          <strong style={{ fontWeight: 600 }}>{takesSummary(takes)}</strong>
          <ul style={{ listStyle: "none", margin: 0, padding: 0 }}>
            {takes.slice(0, mostShown).map((take) => (
              <li key={take.id} style={{ display: "flex", columnGap: 10, padding: "1px 0" }}>
                <EffortBars effort={take.effort} />
                <span>
                  <span style={{ ...soft, whiteSpace: "nowrap", marginRight: 8 }}>{takeDay(take.sungAt)}</span>
                  {setSigns(takeInWords(take, spellingIn(row.key)))}
                  {take.waiting && <span style={soft}>, on this device only</span>}
                </span>
              </li>
            ))}
          </ul>
          {more > 0 && <span style={soft}>{`and ${more} before`}</span>}
        </>
      )}
      <div data-screen="" style={{ display: "flex" }}>
        <TryLink songId={songId} of={row.key} shift={row.shift} again={takes.length > 0} kind="text" />
      </div>
    </div>
  );
}

const steps = [1, 2, 3, 4, 5];

/** How it felt, as rising bars; the words beside say the same. */
function EffortBars({ effort }: { effort: number | null }) {
  const color = (effort ?? 0) >= 4 ? colors.honey : colors.lagoon;
  return (
    <svg width={35} height={14} viewBox="0 0 35 14" aria-hidden style={{ flexShrink: 0, marginTop: 3 }}>
      {steps.map((at) => {
        const tall = 3 + 2 * at;
        const filled = at <= (effort ?? 0);
        return (
          <rect
            key={at}
            x={(at - 1) * 7 + 0.5}
            y={13.5 - tall}
            width={5}
            height={tall}
            rx={1.2}
            style={{ fill: filled ? color : "none", stroke: filled ? color : colors.inkSoft }}
          />
        );
      })}
    </svg>
  );
}

const soft: CSSProperties = { font: `400 13px/18px ${fonts.text}`, color: colors.inkSoft };
