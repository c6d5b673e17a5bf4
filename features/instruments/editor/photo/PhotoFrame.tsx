import { colors } from "@/features/ui/theme";

export interface PhotoFrameProps {
  /** a data address */
  photo: string;
  name: string;
  /** px; three quarters of it high */
  width: number | "100%";
}

/** The photo of an instrument, cut to four by three. */
export function PhotoFrame({ photo, name, width }: PhotoFrameProps) {
  return (
    <img
      src={photo}
      alt={`Photo of ${name}`}
      style={{
        width,
        maxWidth: 320,
        aspectRatio: "4 / 3",
        objectFit: "cover",
        borderRadius: 10,
        border: `1px solid ${colors.line}`,
        flexShrink: 0,
        alignSelf: "flex-start",
      }}
    />
  );
}
