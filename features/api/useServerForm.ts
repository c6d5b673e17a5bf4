import { useEffect, useRef, useState, type RefObject } from "react";
import { useForm, type DefaultValues, type FieldValues, type Path, type UseFormReturn } from "react-hook-form";
import { ApiError } from "./apiError";

/** How far the sending of a form has come. */
interface FormProgress {
  /** what was refused and belongs to no field */
  refusal: ApiError | null;
  sending: boolean;
  /** where the refusal stands, so that it can take the focus */
  problem: RefObject<HTMLDivElement | null>;
}

interface ServerForm<Values extends FieldValues> {
  form: UseFormReturn<Values>;
  /** what the foot of the form shows */
  end: FormProgress;
  /** for the form's onSubmit: checks the fields, sends, and puts each complaint at its place */
  submit: () => void;
}

/** A form whose typed text stays whatever goes wrong. `send` rejects with ApiError; `place` may name the field of a refusal. */
export function useServerForm<Values extends FieldValues>(
  defaultValues: DefaultValues<Values>,
  send: (values: Values) => Promise<void>,
): ServerForm<Values> {
  const [refusal, setRefusal] = useState<ApiError | null>(null);
  const [sending, setSending] = useState(false);
  const form = useForm<Values>({ defaultValues, shouldFocusError: false });
  const { submitCount } = form.formState;

  // The first field that needs mending takes the focus, or else what was said; once for each attempt.
  const problem = useRef<HTMLDivElement>(null);
  const own = useRef<string[]>([]);
  own.current = Object.keys(defaultValues);
  /** the form that was sent, where a page has several */
  const sent = useRef<Element | null>(null);
  useEffect(() => {
    if (submitCount === 0) return;
    const wrong = (sent.current ?? document).querySelector<HTMLElement>("form [aria-invalid=true]");
    (wrong ?? problem.current)?.focus();
  }, [refusal, submitCount]);

  async function attempt(values: Values) {
    setRefusal(null);
    setSending(true);
    try {
      await send(values);
    } catch (error) {
      const refused = error instanceof ApiError ? error : ApiError.offline();
      const known = refused.fields.filter(({ path }) => own.current.includes(path));
      for (const { path, message } of known) form.setError(path as Path<Values>, { type: "server", message });
      setRefusal(known.length > 0 ? null : refused);
    } finally {
      setSending(false);
    }
  }

  function submit() {
    if (sending) return;
    sent.current = document.activeElement?.closest("form") ?? null;
    void form.handleSubmit(attempt)();
  }

  return { form, end: { refusal, sending, problem }, submit };
}
