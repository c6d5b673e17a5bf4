import { useQuery, useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { http } from "@/features/api/httpClient";
import { Card } from "@/features/ui/Card";
import { Form } from "@/features/ui/Form";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import type { PersonFacts } from "@/shared/contract/account";
import { accountQueries } from "../accountQueries";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { useServerForm } from "@/features/api/useServerForm";
import { countryOptions } from "./countryOptions";

const checkYear = (year: string) =>
  year.trim() === "" || /^(19|20)\d\d$/.test(year.trim()) ? null : "Give the year in four digits.";

function FactsForm({ facts }: { facts: PersonFacts }) {
  const client = useQueryClient();
  const [kept, setKept] = useState(false);
  const start = { birthYear: facts.birthYear === null ? "" : String(facts.birthYear), country: facts.country ?? "" };
  const { form, end, submit } = useServerForm(start, async ({ birthYear, country }) => {
    setKept(false);
    const told: PersonFacts = {
      birthYear: birthYear.trim() === "" ? null : Number(birthYear),
      country: country === "" ? null : country,
    };
    client.setQueryData(accountQueries.person().queryKey, await http.put<PersonFacts>("/account/person", told));
    setKept(true);
  });
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
      {kept && <Notice kind="good">Kept.</Notice>}
      <FormEnd small {...end} sendLabel="Keep this" busyLabel="Keeping it" testID="keep-person" />
    </Form>
  );
}

/** Year of birth and country, asked of everybody alike. */
export function AboutYou() {
  const query = useQuery(accountQueries.person());
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
