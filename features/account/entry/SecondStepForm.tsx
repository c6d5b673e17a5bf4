import { useEffect, useRef } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Form } from "@/features/ui/Form";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { checkCode } from "../forms/checkPassword";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { useServerForm } from "@/features/api/useServerForm";
import { movingWords } from "./movingWords";
import { MovesIn } from "./MovesIn";
import type { useEntry } from "./useEntry";

/** After the password: the code of the app, or a recovery code. */
export function SecondStepForm({ entry }: { entry: ReturnType<typeof useEntry> }) {
  const { form, end, submit } = useServerForm({ code: "" }, ({ code }) => entry.secondStep(code.trim()));
  const field = useRef<HTMLDivElement>(null);
  useEffect(() => field.current?.querySelector("input")?.focus(), []);
  return (
    <View style={{ gap: 16 }}>
      <Heading level={2}>Your code</Heading>
      <Text variant="body">
        The password is right. Now type the six digits that your authenticator app shows, or one of your recovery codes.
      </Text>
      <Form label="Second step" onSubmit={() => entry.entering || submit()}>
        <div ref={field}>
          <FormField
            form={form}
            name="code"
            label="Code"
            check={checkCode}
            hint="Without the phone at hand: a recovery code, such as k7mq2x-9fdw4h. Each is good once."
            autoComplete="one-time-code"
            testID="code"
          />
        </div>
        <MovesIn />
        <FormEnd
          {...end}
          sending={entry.entering}
          sendLabel="Sign in"
          busyLabel={movingWords(entry.entering, entry.progress) ?? "Signing in"}
        />
      </Form>
      <Button
        kind="text"
        flush
        small
        label="Back to the password"
        onPress={() => entry.back()}
        testID="back-to-password"
      />
    </View>
  );
}
