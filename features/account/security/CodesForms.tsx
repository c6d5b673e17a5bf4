import { http } from "@/features/api/httpClient";
import { Form } from "@/features/ui/Form";
import { Text } from "@/features/ui/Text";
import type { RecoveryCodes } from "@/shared/contract/account";
import { checkCode } from "../forms/checkPassword";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { KnownPasswordField } from "../forms/PasswordField";
import { useServerForm } from "@/features/api/useServerForm";
import { NotNow } from "./EnrolForms";

interface BothProps {
  label: string;
  text: string;
  busyLabel: string;
  send: (typed: { password: string; code: string }) => Promise<void>;
  onBack: () => void;
}

/** Password and code together, before something that weakens or renews the second step. */
function PasswordAndCode({ label, text, busyLabel, send, onBack }: BothProps) {
  const { form, end, submit } = useServerForm({ password: "", code: "" }, (typed) =>
    send({ password: typed.password, code: typed.code.trim() }),
  );
  return (
    <Form label={label} onSubmit={submit}>
      <Text variant="body">{text}</Text>
      <KnownPasswordField form={form} name="password" testID="codes-password" />
      <FormField
        form={form}
        name="code"
        label="Code"
        check={checkCode}
        hint="Of the app, or a recovery code."
        autoComplete="one-time-code"
        testID="codes-code"
      />
      <FormEnd small {...end} sendLabel={label} busyLabel={busyLabel} testID="codes-send" />
      <NotNow onBack={onBack} />
    </Form>
  );
}

export function CodesOffForm({ onOff, onBack }: { onOff: () => void; onBack: () => void }) {
  return (
    <PasswordAndCode
      label="Switch codes off"
      text="After this, your password alone opens the account, and the recovery codes are worth nothing."
      busyLabel="Switching off"
      send={async (typed) => {
        await http.post("/account/second-factor/off", typed);
        onOff();
      }}
      onBack={onBack}
    />
  );
}

export function NewCodesForm(props: { onCodes: (codes: readonly string[]) => void; onBack: () => void }) {
  return (
    <PasswordAndCode
      label="Make new recovery codes"
      text="The old recovery codes are worth nothing from then on."
      busyLabel="Making them"
      send={async (typed) =>
        props.onCodes((await http.post<RecoveryCodes>("/account/second-factor/recovery-codes", typed)).recoveryCodes)
      }
      onBack={props.onBack}
    />
  );
}
