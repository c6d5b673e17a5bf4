import { Controller, type FieldValues, type Path, type UseFormReturn } from "react-hook-form";
import { Field, type FieldProps } from "../Field";

export interface FormFieldProps<Values extends FieldValues> extends Pick<
  FieldProps,
  "label" | "hint" | "autoComplete" | "inputMode" | "multiline" | "rows" | "testID"
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
