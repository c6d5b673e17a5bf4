import { AskedTwice } from "@/features/ui/AskedTwice";

export interface RemoveSongProps {
  title: string;
  onRemove: () => void;
  busy: boolean;
  error: Error | null;
}

/** Deletes only after it was asked twice. */
export function RemoveSong({ title, ...rest }: RemoveSongProps) {
  return (
    <AskedTwice
      {...rest}
      label="Delete the song"
      question={`Delete “${title}”?`}
      text="Its chart, its melody and your key for it go too. This cannot be undone."
      failed="It is not deleted."
      testID="remove-song"
    />
  );
}
