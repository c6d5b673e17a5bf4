import { useEffect, useRef, useState, type ReactNode } from "react";
import { Controller, useForm } from "react-hook-form";
import { View } from "react-native";
import { ApiError } from "@/features/api/apiError";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { Form } from "@/features/ui/Form";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import type { MoveInState } from "@/features/api/moveIn";
import type { SignInRequest } from "@/shared/contract/account";

interface CredentialsFormProps {
  label: string;
  sendLabel: string;
  busyLabel: string;
  passwordHint?: string;
  passwordKind: "new-password" | "current-password";
  /** what is wrong with a password before it is sent; null if nothing */
  checkPassword: (password: string) => string | null;
  entering: boolean;
  progress: MoveInState;
  enter: (credentials: SignInRequest) => Promise<void>;
  /** words between the fields and the button */
  children?: ReactNode;
}

const noticeKind = (code: string) => (code === "offline" ? "offline" : code === "too-many-tries" ? "caution" : "error");

/** E-mail address and password. Whatever goes wrong, what was typed stays. */
export function CredentialsForm(props: CredentialsFormProps) {
  const { entering, progress } = props;
  const [refusal, setRefusal] = useState<ApiError | null>(null);
  const [shown, setShown] = useState(false);
  const form = useForm<SignInRequest>({ defaultValues: { email: "", password: "" }, shouldFocusError: false });
  const { errors, submitCount } = form.formState;

  // The first field that needs mending takes the focus, or else what was said; once for each attempt.
  const problem = useRef<HTMLDivElement>(null);
  useEffect(() => {
    const wrong = document.querySelector<HTMLElement>("form [aria-invalid=true]");
    if (submitCount > 0) (wrong ?? problem.current)?.focus();
  }, [refusal, submitCount]);

  async function send(credentials: SignInRequest) {
    setRefusal(null);
    try {
      await props.enter({ email: credentials.email.trim(), password: credentials.password });
    } catch (error) {
      const refused = error instanceof ApiError ? error : ApiError.offline();
      const placed = refused.code === "email-taken" ? [{ path: "email", message: refused.message }] : refused.fields;
      const known = placed.filter(({ path }) => path === "email" || path === "password");
      for (const { path, message } of known) form.setError(path as keyof SignInRequest, { type: "server", message });
      setRefusal(known.length > 0 ? null : refused);
    }
  }

  const moving = entering && progress.status === "moving";
  const busyLabel = moving ? `Moving your things: ${progress.moved} of ${progress.total}` : props.busyLabel;
  return (
    <Form label={props.label} onSubmit={() => void (entering || form.handleSubmit(send)())}>
      <Controller
        control={form.control}
        name="email"
        rules={{ validate: (email) => email.trim() !== "" || "Type your e-mail address." }}
        render={({ field }) => (
          <Field
            label="E-mail address"
            value={field.value}
            onChangeText={field.onChange}
            onBlur={field.onBlur}
            error={errors.email?.message}
            autoComplete="email"
            inputMode="email"
            testID="email"
          />
        )}
      />
      <View>
        <Controller
          control={form.control}
          name="password"
          rules={{ validate: (password) => props.checkPassword(password) ?? true }}
          render={({ field }) => (
            <Field
              label="Password"
              value={field.value}
              onChangeText={field.onChange}
              onBlur={field.onBlur}
              error={errors.password?.message}
              hint={props.passwordHint}
              secure={!shown}
              autoComplete={props.passwordKind}
              testID="password"
            />
          )}
        />
        <View style={{ alignSelf: "flex-start", marginLeft: -8 }}>
          <Button
            kind="text"
            small
            label={shown ? "Hide password" : "Show password"}
            onPress={() => setShown(!shown)}
            testID="show-password"
          />
        </View>
      </View>
      {props.children}
      {refusal && (
        <div ref={problem} tabIndex={-1}>
          <Notice kind={noticeKind(refusal.code)} testID="form-problem">
            {refusal.code === "offline" ? `${refusal.message} What you typed is still here.` : refusal.message}
          </Notice>
        </div>
      )}
      <Button
        submit
        label={entering ? busyLabel : props.sendLabel}
        busy={entering}
        onPress={() => undefined}
        testID="send"
      />
      <LiveText hidden>{entering ? busyLabel : ""}</LiveText>
    </Form>
  );
}
