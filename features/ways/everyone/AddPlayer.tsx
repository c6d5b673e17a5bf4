import { useState } from "react";
import { View } from "react-native";
import { newId } from "@/features/api/newId";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { Form } from "@/features/ui/Form";
import { Select } from "@/features/ui/Select";
import type { Player } from "@/shared/contract/lineUp";

export interface AddPlayerProps {
  /** all instruments there are to choose */
  offered: readonly { value: string; label: string }[];
  /** the one that stands there first */
  first: string;
  onAdd: (player: Player) => void;
}

/** Who plays along, and on what. */
export function AddPlayer({ offered, first, onAdd }: AddPlayerProps) {
  const [name, setName] = useState("");
  const [instrument, setInstrument] = useState(first);
  const [missing, setMissing] = useState(false);
  const add = () => {
    if (name.trim() === "") {
      setMissing(true);
      return;
    }
    onAdd({ id: newId(), name: name.trim().slice(0, 80), instrument, way: null });
    setName("");
    setMissing(false);
  };
  return (
    <Form label="Add a player" onSubmit={add}>
      <View style={{ gap: 12, maxWidth: 520 }} testID="add-player">
        <Field
          label="Who plays"
          value={name}
          onChangeText={setName}
          placeholder="Such as Ilse"
          error={missing && name.trim() === "" ? "Say who plays." : undefined}
          autoComplete="off"
          testID="player-name"
        />
        <Select
          label="On what"
          value={instrument}
          options={offered}
          onChange={setInstrument}
          testID="player-instrument"
        />
        <Button
          kind="secondary"
          small
          icon="plus"
          label="Add this player"
          submit
          onPress={() => undefined}
          testID="player-add"
        />
      </View>
    </Form>
  );
}
