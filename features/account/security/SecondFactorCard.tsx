import { useQuery, useQueryClient } from "@tanstack/react-query";
import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { session } from "@/features/api/session";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import type { Account, SecondFactorSetup } from "@/shared/contract/account";
import { accountQueries } from "../accountQueries";
import { CodesOffForm, NewCodesForm } from "./CodesForms";
import { BeginForm, ConfirmForm } from "./EnrolForms";
import { RecoveryCodesShown } from "./RecoveryCodesShown";

type Step =
  | { name: "rest" }
  | { name: "begin" }
  | { name: "confirm"; setup: SecondFactorSetup }
  | { name: "codes"; codes: readonly string[] }
  | { name: "off" }
  | { name: "new-codes" };

/** Codes of an authenticator app as a second step of signing in: on, off, and the recovery codes. */
export function SecondFactorCard({ account }: { account: Account }) {
  const client = useQueryClient();
  const query = useQuery(accountQueries.secondFactor());
  const [step, setStep] = useState<Step>({ name: "rest" });
  const top = useRef<HTMLDivElement>(null);
  const before = useRef(step.name);
  useEffect(() => {
    // The button that was pressed is gone with its step.
    if (before.current !== step.name) top.current?.focus();
    before.current = step.name;
  }, [step.name]);

  async function changed() {
    await client.invalidateQueries({ queryKey: accountQueries.secondFactor().queryKey });
    session.accountChanged(await http.get<Account>("/account"));
  }
  const rest = () => setStep({ name: "rest" });
  const show = (codes: readonly string[]) => {
    setStep({ name: "codes", codes });
    // The codes are shown whatever becomes of this; the next page asks anew.
    changed().catch(() => undefined);
  };

  return (
    <Card style={{ gap: 16 }} testID="second-factor">
      <div ref={top} tabIndex={-1} style={{ outline: "none" }}>
        <Heading level={2}>Codes for signing in</Heading>
      </div>
      <QueryState query={query} title="This could not be opened">
        {({ on, recoveryCodesLeft }) => {
          if (step.name === "begin")
            return <BeginForm onBegun={(setup) => setStep({ name: "confirm", setup })} onBack={rest} />;
          if (step.name === "confirm") return <ConfirmForm setup={step.setup} onOn={show} onBack={rest} />;
          if (step.name === "codes") return <RecoveryCodesShown codes={step.codes} onKept={rest} />;
          if (step.name === "new-codes") return <NewCodesForm onCodes={show} onBack={rest} />;
          if (step.name === "off")
            return (
              <CodesOffForm
                onOff={() => {
                  rest();
                  changed().catch(() => undefined);
                }}
                onBack={rest}
              />
            );
          return (
            <>
              <Text variant="body">
                {on
                  ? `Signing in takes a code of your authenticator app. Recovery codes left: ${recoveryCodesLeft}.`
                  : "Off. With codes, signing in takes your password and six digits from an authenticator app. Whoever finds out your password alone stays outside."}
              </Text>
              {!on && !account.confirmed && (
                <Notice kind="caution">Confirm your e-mail address first, by the link we sent you.</Notice>
              )}
              <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
                {on ? (
                  <>
                    <Button
                      kind="secondary"
                      small
                      label="New recovery codes"
                      onPress={() => setStep({ name: "new-codes" })}
                      testID="new-codes"
                    />
                    <Button
                      kind="text"
                      small
                      label="Switch codes off"
                      onPress={() => setStep({ name: "off" })}
                      testID="codes-off"
                    />
                  </>
                ) : (
                  <Button
                    kind="secondary"
                    small
                    label="Switch codes on"
                    disabled={!account.confirmed}
                    onPress={() => setStep({ name: "begin" })}
                    testID="codes-on"
                  />
                )}
              </View>
            </>
          );
        }}
      </QueryState>
    </Card>
  );
}
