import type { ReactNode } from "react";
import { Form } from "@/features/ui/Form";
import type { MoveInState } from "@/features/api/moveIn";
import type { SignInRequest } from "@/shared/contract/account";
import { checkAddress } from "../forms/checkPassword";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { PasswordField } from "../forms/PasswordField";
import { useServerForm } from "@/features/api/useServerForm";
import { movingWords } from "./movingWords";

interface CredentialsFormProps {
  label: string;
  sendLabel: string;
  busyLabel: string;
  passwordHint?: string;
  passwordKind: "new-password" | "current-password";
  /** what is wrong with a password before it is sent; null if nothing */
  checkPassword: (password: string) => string | null;
  /** typed before the step that was given up */
  email: string;
  entering: boolean;
  progress: MoveInState;
  enter: (credentials: SignInRequest) => Promise<void>;
  /** words between the fields and the button */
  children?: ReactNode;
}

/** E-mail address and password. Whatever goes wrong, what was typed stays. */
export function CredentialsForm(props: CredentialsFormProps) {
  const { entering, progress } = props;
  const { form, end, submit } = useServerForm<SignInRequest>(
    { email: props.email, password: "" },
    ({ email, password }) => props.enter({ email: email.trim(), password }),
  );
  return (
    <Form label={props.label} onSubmit={() => entering || submit()}>
      <FormField
        form={form}
        name="email"
        label="E-mail address"
        check={checkAddress}
        autoComplete="email"
        inputMode="email"
        testID="email"
      />
      <PasswordField
        form={form}
        name="password"
        label="Password"
        check={props.checkPassword}
        hint={props.passwordHint}
        autoComplete={props.passwordKind}
        testID="password"
      />
      {props.children}
      <FormEnd
        {...end}
        sending={entering}
        sendLabel={props.sendLabel}
        busyLabel={movingWords(entering, progress) ?? props.busyLabel}
      />
    </Form>
  );
}
