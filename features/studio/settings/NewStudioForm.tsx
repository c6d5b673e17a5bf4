import { type Href, useRouter } from "expo-router";
import { http } from "@/features/api/httpClient";
import { useServerForm } from "@/features/api/useServerForm";
import { Form } from "@/features/ui/Form";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { PhoneFoot } from "@/features/ui/PhoneFoot";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { Studio } from "@/shared/contract/studio/studio";
import { useStudioRefresh } from "../studioQueries";
import { StudioFields } from "./StudioFields";
import { checkPerson, newDraft, readDraft } from "./studioForm";

/** Begins a studio; whoever does is its owner. */
export function NewStudioForm() {
  const router = useRouter();
  const refresh = useStudioRefresh();
  const { form, end, submit } = useServerForm({ ...newDraft, teacherName: "" }, async ({ teacherName, ...draft }) => {
    const made = await http.post<Studio>("/studios", { ...readDraft(draft), teacherName: teacherName.trim() });
    await refresh();
    router.replace(`/studio/${made.id}` as Href);
  });
  const phone = useLayout() === "phone";
  const foot = <FormEnd {...end} sendLabel="Begin the studio" busyLabel="Beginning the studio" testID="make-studio" />;
  return (
    <Form label="A new studio" onSubmit={submit}>
      <Text>
        A studio is your group of pupils. You give them songs, each in their own key, and hear what they hand in. They
        decide what you see of them.
      </Text>
      <StudioFields form={form} />
      <FormField
        form={form}
        name="teacherName"
        label="What you are called there"
        hint="Your pupils see this name."
        check={checkPerson}
        autoComplete="name"
        testID="teacher-name"
      />
      {phone ? <PhoneFoot>{foot}</PhoneFoot> : foot}
    </Form>
  );
}
