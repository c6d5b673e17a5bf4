import type { ReactNode } from "react";

export interface FormProps {
  /** what is filled in here, for screen readers */
  label: string;
  onSubmit: () => void;
  children: ReactNode;
  gap?: number;
}

/** A real form, so that Enter sends it and password keepers know it. Its sending button is `<Button submit>`. */
export function Form({ label, onSubmit, children, gap = 16 }: FormProps) {
  return (
    <form
      aria-label={label}
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        onSubmit();
      }}
      style={{ display: "flex", flexDirection: "column", gap }}
    >
      {children}
    </form>
  );
}
