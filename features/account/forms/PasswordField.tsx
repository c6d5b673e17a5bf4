import { useState } from "react";
import type { FieldValues } from "react-hook-form";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { FormField, type FormFieldProps } from "@/features/ui/form/FormField";
import { checkKnownPassword } from "./checkPassword";

/** A password, which can be looked at. */
export function PasswordField<Values extends FieldValues>(props: Omit<FormFieldProps<Values>, "secure">) {
  const [shown, setShown] = useState(false);
  const which = props.label === "Password" ? "password" : props.label.toLowerCase();
  return (
    <View>
      <FormField {...props} secure={!shown} />
      <Button
        kind="text"
        flush
        small
        label={shown ? `Hide ${which}` : `Show ${which}`}
        onPress={() => setShown(!shown)}
        testID={`show-${props.testID ?? "password"}`}
      />
    </View>
  );
}

/** The password that the account has, asked once more before something that matters. */
export function KnownPasswordField<Values extends FieldValues>({
  label = "Password",
  ...field
}: Pick<FormFieldProps<Values>, "form" | "name" | "testID"> & { label?: string }) {
  return <PasswordField {...field} label={label} check={checkKnownPassword} autoComplete="current-password" />;
}
