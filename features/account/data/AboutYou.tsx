import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { checkYear, personQuery, readPerson, typedPerson } from "@/features/api/person/personFacts";
import { useKeepPerson } from "@/features/api/person/useKeepPerson";
import { useServerForm } from "@/features/api/useServerForm";
import { Card } from "@/features/ui/Card";
import { Form } from "@/features/ui/Form";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Question } from "@/features/ui/Question";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import type { PersonFacts } from "@/shared/contract/account";
import { countryOptions } from "./countryOptions";

function FactsForm({ facts }: { facts: PersonFacts }) {
  const [kept, setKept] = useState(false);
  const start = typedPerson(facts);
  const { form, end, submit } = useServerForm(start, async (typed) => {
    setKept(false);
    setKept(await keep(readPerson(typed)));
  });
  const { keep, question } = useKeepPerson({ onEnded: () => setKept(true), onStay: () => form.reset(start) });
  return (
    <Form label="About you" onSubmit={submit}>
      <FormField
        form={form}
        name="birthYear"
        label="Year of birth"
        check={checkYear}
        inputMode="numeric"
        testID="birth-year"
      />
      <Select
        label="Country"
        options={countryOptions}
        value={form.watch("country")}
        onChange={(country) => form.setValue("country", country)}
        error={form.formState.errors.country?.message}
        testID="country"
      />
      {question && <Question {...question} />}
      {kept && <Notice kind="good">Kept.</Notice>}
      <FormEnd small {...end} sendLabel="Keep this" busyLabel="Keeping it" testID="keep-person" />
    </Form>
  );
}

/** Year of birth and country, asked of everybody alike. */
export function AboutYou() {
  const query = useQuery(personQuery);
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>About you</Heading>
      <Text variant="small" tone="soft">
        Asked of everybody. The rules for sharing recordings differ by age and country.
      </Text>
      <QueryState query={query} title="This could not be opened">
        {(facts) => <FactsForm facts={facts} />}
      </QueryState>
    </Card>
  );
}
