import { colors } from "@/features/ui/theme";

/** The beats of a bar as rings, the present one filled: a metronome to look at. */
export function BeatDots({ beats, now }: { beats: number; now: number | null }) {
  return (
    <span
      role="img"
      aria-label={`${beats} ${beats === 1 ? "beat" : "beats"} in a bar`}
      style={{ display: "flex", gap: beats > 6 ? 4 : 8, flexWrap: "wrap", justifyContent: "center" }}
    >
      {Array.from({ length: beats }, (_, beat) => (
        <span
          key={beat}
          data-on={beat === now ? "" : undefined}
          style={{
            width: beats > 6 ? 8 : 12,
            height: beats > 6 ? 8 : 12,
            borderRadius: "50%",
            ...(beat === now ? { background: colors.plum } : { boxShadow: `inset 0 0 0 1.5px ${colors.inkSoft}` }),
          }}
        />
      ))}
    </span>
  );
}
