import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Form } from "@/features/ui/Form";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import type { PersonFacts, PersonFactsChange } from "@/shared/contract/account";
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
  /** why it is asked first, and what was to be kept */
  const [asked, setAsked] = useState<{ why: string; told: PersonFacts } | null>(null);
  const keep = async (told: PersonFactsChange) => {
    client.setQueryData(accountQueries.person().queryKey, await http.put<PersonFacts>("/account/person", told));
    setKept(true);
  };
  const start = { birthYear: facts.birthYear === null ? "" : String(facts.birthYear), country: facts.country ?? "" };
  const { form, end, submit } = useServerForm(start, async ({ birthYear, country }) => {
    setKept(false);
    setAsked(null);
    const told: PersonFacts = {
      birthYear: birthYear.trim() === "" ? null : Number(birthYear),
      country: country === "" ? null : country,
    };
    try {
      await keep(told);
    } catch (error) {
      if (!(error instanceof ApiError) || error.code !== "ends-sharing") throw error;
      setAsked({ why: error.message, told });
    }
  });
  const ending = useMutation({
    mutationFn: async ({ told }: { told: PersonFacts }) => {
      await keep({ ...told, endsSharing: true });
      setAsked(null);
      await client.invalidateQueries({ queryKey: ["studio"] });
    },
    networkMode: "always",
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
      {asked && (
        <EndsSharing
          why={asked.why}
          busy={ending.isPending}
          error={ending.error}
          onEnd={() => ending.mutate(asked)}
          onKeep={() => {
            setAsked(null);
            form.reset(start);
          }}
        />
      )}
      {kept && <Notice kind="good">Kept.</Notice>}
      <FormEnd small {...end} sendLabel="Keep this" busyLabel="Keeping it" testID="keep-person" />
    </Form>
  );
}

interface EndsSharingProps {
  why: string;
  busy: boolean;
  error: Error | null;
  onEnd: () => void;
  onKeep: () => void;
}

/** Asks before recordings are deleted by what was typed. */
function EndsSharing({ why, busy, error, onEnd, onKeep }: EndsSharingProps) {
  const group = useRef<HTMLDivElement>(null);
  useEffect(() => group.current?.focus(), []);
  return (
    <div ref={group} role="group" aria-label="Stop sharing?" tabIndex={-1}>
      <Notice kind="caution" title="Stop sharing?" testID="ends-sharing">
        <Text variant="small">{why}</Text>
        {error && <Text variant="small" tone="brick">{`Nothing was changed. ${error.message}`}</Text>}
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8, marginTop: 8 }}>
          <Button small label="Stop and delete them" busy={busy} onPress={onEnd} testID="end-sharing" />
          <Button kind="secondary" small label="Go on sharing" onPress={onKeep} testID="go-on-sharing" />
        </View>
      </Notice>
    </div>
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
