import type { FieldValues, Path, PathValue, UseFormReturn } from "react-hook-form";
import { View } from "react-native";
import { FormField } from "@/features/ui/form/FormField";
import { useLayout } from "@/features/ui/useLayout";
import { DayField } from "../DayField";
import { checkKeptDays, checkName, type StudioDraft } from "./studioForm";

/** The fields that make a studio; those of its owner's name stand in the form of a new one. */
export function StudioFields<Values extends FieldValues & StudioDraft>({ form }: { form: UseFormReturn<Values> }) {
  const phone = useLayout() === "phone";
  const day = "eventDate" as Path<Values>;
  return (
    <>
      <FormField
        form={form}
        name={"name" as Path<Values>}
        label="Name of the studio"
        hint="Pupils read it in their mail, such as: Tuesday evening class, Harrowmouth"
        check={checkName}
        testID="studio-name"
      />
      <View style={{ flexDirection: phone ? "column" : "row", gap: 16 }}>
        <View style={phone ? null : { flexGrow: 1, flexBasis: 0 }}>
          <FormField
            form={form}
            name={"eventName" as Path<Values>}
            label="An evening you work towards"
            hint="If there is one, such as: Concert"
            check={(name) => (name.trim().length > 80 ? "A name may have at most 80 characters." : null)}
            testID="event-name"
          />
        </View>
        <View style={phone ? null : { flexGrow: 1, flexBasis: 0 }}>
          <DayField
            label="Its day"
            value={form.watch(day) as string}
            onChange={(value) => form.setValue(day, value as PathValue<Values, Path<Values>>)}
            testID="event-date"
          />
        </View>
      </View>
      <FormField
        form={form}
        name={"keptDays" as Path<Values>}
        label="Days that recordings are kept"
        hint="After that they are deleted by themselves. Pupils are told before they agree."
        check={checkKeptDays}
        inputMode="numeric"
        testID="kept-days"
      />
    </>
  );
}
