import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { http } from "@/features/api/httpClient";
import { checkYear, personQuery, readPerson, typedPerson } from "@/features/api/person/personFacts";
import { useKeepPerson } from "@/features/api/person/useKeepPerson";
import { useServerForm } from "@/features/api/useServerForm";
import { Choice } from "@/features/ui/Choice";
import { Form } from "@/features/ui/Form";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { QueryState } from "@/features/ui/QueryState";
import { Question } from "@/features/ui/Question";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import type { PersonFacts } from "@/shared/contract/account";
import type { InviteLook } from "@/shared/contract/studio/invite";
import type { Studio } from "@/shared/contract/studio/studio";
import { checkPerson } from "../settings/studioForm";
import { useStudioRefresh } from "../studioQueries";

export interface JoinFormProps {
  look: Pick<InviteLook, "role">;
  token: string;
  countries: readonly { value: string; label: string }[];
  onJoined: (studio: Studio) => void;
}

/** Joining: a name, and for pupils the year of birth, the country, and whether they agree. */
export function JoinForm(props: JoinFormProps) {
  const person = useQuery(personQuery);
  return (
    <QueryState query={person} title="Your account could not be asked">
      {(facts) => <Fields {...props} facts={facts} />}
    </QueryState>
  );
}

type Wish = "agree" | "later";
const wishes: { value: Wish; label: string; hint: string }[] = [
  { value: "agree", label: "I agree", hint: "My teachers see what is listed here. I can take it back at any time." },
  { value: "later", label: "Join without agreeing", hint: "They see only my name. I can agree later." },
];

function Fields({ look, token, countries, facts, onJoined }: JoinFormProps & { facts: PersonFacts }) {
  const refresh = useStudioRefresh();
  const pupil = look.role === "pupil";
  const [wish, setWish] = useState<Wish | null>(null);
  const [missing, setMissing] = useState(false);
  const before = typedPerson(facts);
  const { form, end, submit } = useServerForm({ name: "", ...before }, async ({ name, ...typed }) => {
    if (pupil && wish === null) {
      setMissing(true);
      return;
    }
    if (pupil && typed.birthYear.trim() !== "" && !(await keep(readPerson(typed)))) return;
    const studio = await http.post<Studio>("/invites/accept", {
      token,
      name: name.trim(),
      agree: pupil && wish === "agree",
    });
    await refresh();
    onJoined(studio);
  });
  const { keep, question } = useKeepPerson({
    onEnded: submit,
    onStay: () => {
      form.setValue("birthYear", before.birthYear);
      form.setValue("country", before.country);
    },
  });
  const checkYearHere = (year: string) =>
    year.trim() === "" && wish === "agree" ? "Give the year; the rules differ by age and country." : checkYear(year);
  return (
    <Form label="Join the studio" onSubmit={submit}>
      <FormField
        form={form}
        name="name"
        label="Your name there"
        hint="As your teacher knows you."
        check={checkPerson}
        autoComplete="name"
        testID="join-name"
      />
      {pupil && (
        <>
          <FormField
            form={form}
            name="birthYear"
            label="Year of birth"
            hint="Asked of everybody. The rules for sharing recordings differ by age and country."
            check={checkYearHere}
            inputMode="numeric"
            testID="join-year"
          />
          <Select
            label="Country"
            options={countries}
            value={form.watch("country")}
            onChange={(country) => form.setValue("country", country)}
            testID="join-country"
          />
          <Choice
            label="What your teachers see"
            options={wishes}
            value={wish}
            onChange={(value) => {
              setWish(value);
              setMissing(false);
            }}
            testID="join-wish"
          />
          {missing && (
            <Text variant="small" tone="brick" role="alert" testID="wish-missing">
              Choose one of the two.
            </Text>
          )}
        </>
      )}
      {question && <Question {...question} />}
      <FormEnd {...end} sendLabel="Join the studio" busyLabel="Joining the studio" testID="join" />
    </Form>
  );
}
