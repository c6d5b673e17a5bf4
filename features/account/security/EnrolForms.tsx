import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { Button } from "@/features/ui/Button";
import { Form } from "@/features/ui/Form";
import { Text } from "@/features/ui/Text";
import type { RecoveryCodes, SecondFactorSetup } from "@/shared/contract/account";
import { checkCode } from "../forms/checkPassword";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { KnownPasswordField } from "../forms/PasswordField";
import { useServerForm } from "@/features/api/useServerForm";

export function NotNow({ onBack }: { onBack: () => void }) {
  return <Button kind="text" flush small label="Not now" onPress={onBack} testID="not-now" />;
}

/** First the password, so that nobody at an unlocked device switches codes on. */
export function BeginForm({ onBegun, onBack }: { onBegun: (setup: SecondFactorSetup) => void; onBack: () => void }) {
  const { form, end, submit } = useServerForm({ password: "" }, async (typed) =>
    onBegun(await http.post<SecondFactorSetup>("/account/second-factor", typed)),
  );
  return (
    <Form label="Switch codes on" onSubmit={submit}>
      <KnownPasswordField form={form} name="password" testID="codes-password" />
      <FormEnd small {...end} sendLabel="Go on" busyLabel="One moment" testID="codes-begin" />
      <NotNow onBack={onBack} />
    </Form>
  );
}

/** The secret for the app, as a picture and as text, and a first code to see that both agree. */
export function ConfirmForm(props: {
  setup: SecondFactorSetup;
  onOn: (codes: readonly string[]) => void;
  onBack: () => void;
}) {
  const { form, end, submit } = useServerForm({ code: "" }, async ({ code }) => {
    const answer = await http.post<RecoveryCodes>("/account/second-factor/confirm", { code: code.trim() });
    props.onOn(answer.recoveryCodes);
  });
  const { qrSvg, secret } = props.setup;
  return (
    <View style={{ gap: 16 }}>
      <Text variant="body">Scan this picture with your authenticator app, or type the secret into it.</Text>
      <img
        src={`data:image/svg+xml,${encodeURIComponent(qrSvg)}`}
        alt="QR picture of the secret below, for the authenticator app"
        width={200}
        height={200}
        style={{ borderRadius: 10, alignSelf: "center" }}
      />
      <View>
        <Text variant="small" tone="soft">
          Secret
        </Text>
        <Text variant="mono" testID="secret" style={{ overflowWrap: "anywhere" } as object}>
          {secret.match(/.{1,4}/g)?.join(" ")}
        </Text>
      </View>
      <Form label="First code" onSubmit={submit}>
        <FormField
          form={form}
          name="code"
          label="Code of the app"
          check={checkCode}
          hint="The six digits that the app shows now."
          autoComplete="one-time-code"
          inputMode="numeric"
          testID="first-code"
        />
        <FormEnd small {...end} sendLabel="Switch codes on" busyLabel="Switching on" testID="codes-confirm" />
        <NotNow onBack={props.onBack} />
      </Form>
    </View>
  );
}
