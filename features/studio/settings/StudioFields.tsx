import type { FieldValues, Path, PathValue, UseFormReturn } from "react-hook-form";
import { View } from "react-native";
import { FormField } from "@/features/ui/form/FormField";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import { plural } from "@/shared/music/countWords";
import { DayField } from "../DayField";
import { checkKeptDays, checkName, type StudioDraft } from "./studioForm";

interface StudioFieldsProps<Values extends FieldValues> {
  form: UseFormReturn<Values>;
  /** how long recordings are kept is the owner's to say */
  owner?: boolean;
}

/** The fields that make a studio; those of its owner's name stand in the form of a new one. */
export function StudioFields<Values extends FieldValues & StudioDraft>({
  form,
  owner = true,
}: StudioFieldsProps<Values>) {
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
      {owner ? (
        <FormField
          form={form}
          name={"keptDays" as Path<Values>}
          label="Days that recordings are kept"
          hint="After that they are deleted by themselves. Pupils are told before they agree; more days hold only for those who agree later."
          check={checkKeptDays}
          inputMode="numeric"
          testID="kept-days"
        />
      ) : (
        <Text variant="small" tone="soft">
          {`Recordings are kept for ${plural(Number(form.getValues("keptDays" as Path<Values>)), "day")}. Only the owner changes that.`}
        </Text>
      )}
    </>
  );
}
