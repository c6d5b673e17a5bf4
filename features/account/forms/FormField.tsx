import { useState } from "react";
import { Controller, type FieldValues, type Path, type UseFormReturn } from "react-hook-form";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Field, type FieldProps } from "@/features/ui/Field";
import { checkKnownPassword } from "./checkPassword";

export interface FormFieldProps<Values extends FieldValues> extends Pick<
  FieldProps,
  "label" | "hint" | "autoComplete" | "inputMode" | "testID"
> {
  form: UseFormReturn<Values>;
  name: Path<Values>;
  /** what is wrong with what was typed; null if nothing */
  check: (text: string) => string | null;
  secure?: boolean;
}

/** A field of a form, with its complaint in place. */
export function FormField<Values extends FieldValues>({ form, name, check, ...look }: FormFieldProps<Values>) {
  const error = form.getFieldState(name, form.formState).error?.message;
  return (
    <Controller
      control={form.control}
      name={name}
      rules={{ validate: (text: string) => check(text) ?? true }}
      render={({ field }) => (
        <Field
          {...look}
          value={field.value as string}
          onChangeText={field.onChange}
          onBlur={field.onBlur}
          error={error}
        />
      )}
    />
  );
}

/** A password, which can be looked at. */
export function PasswordField<Values extends FieldValues>(props: Omit<FormFieldProps<Values>, "secure">) {
  const [shown, setShown] = useState(false);
  const which = props.label === "Password" ? "password" : props.label.toLowerCase();
  return (
    <View>
      <FormField {...props} secure={!shown} />
      <View style={{ alignSelf: "flex-start", marginLeft: -8 }}>
        <Button
          kind="text"
          small
          label={shown ? `Hide ${which}` : `Show ${which}`}
          onPress={() => setShown(!shown)}
          testID={`show-${props.testID ?? "password"}`}
        />
      </View>
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
