import { useRef, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { PhotoFrame } from "./PhotoFrame";
import { shrinkPhoto } from "./shrinkPhoto";

export interface PhotoFieldProps {
  photo: string | null;
  name: string;
  onChange: (photo: string | null) => void;
}

/** A photo of the instrument, made small on the device before it is kept. */
export function PhotoField({ photo, name, onChange }: PhotoFieldProps) {
  const input = useRef<HTMLInputElement>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const choose = async (file: File | undefined) => {
    if (!file) return;
    setBusy(true);
    const shrunk = await shrinkPhoto(file);
    setBusy(false);
    setProblem("problem" in shrunk ? shrunk.problem : null);
    if ("photo" in shrunk) onChange(shrunk.photo);
  };
  return (
    <View style={{ gap: 8 }}>
      <Heading level={2}>Photo</Heading>
      {photo === null ? (
        <Text variant="small" tone="soft">
          If you like. It is made small on this device and kept with the instrument.
        </Text>
      ) : (
        <PhotoFrame photo={photo} name={name || "this instrument"} width="100%" />
      )}
      {problem !== null && <Notice kind="error">{problem}</Notice>}
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
        <Button
          kind="secondary"
          small
          label={photo === null ? "Add a photo" : "Another photo"}
          busy={busy}
          onPress={() => input.current?.click()}
          testID="choose-photo"
        />
        {photo !== null && (
          <Button
            kind="text"
            small
            icon="trash"
            label="Take it out"
            onPress={() => onChange(null)}
            testID="remove-photo"
          />
        )}
      </View>
      <input
        ref={input}
        type="file"
        accept="image/*"
        aria-label="Photo of the instrument"
        data-testid="photo-file"
        hidden
        onChange={(event) => {
          void choose(event.target.files?.[0]);
          event.target.value = "";
        }}
      />
    </View>
  );
}
