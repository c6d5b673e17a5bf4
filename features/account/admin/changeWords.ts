import type { QuestionProps } from "@/features/ui/Question";
import type { Role } from "@/shared/contract/account";
import type { AdminUser } from "@/shared/contract/admin";

/** What an administrator is about to do to somebody's account. */
export type AdminChange = { user: AdminUser } & (
  { what: "role"; body: { role: Role } } | { what: "suspension"; body: { suspended: boolean } }
);

type Words = Pick<QuestionProps, "question" | "text" | "confirmLabel">;

const roleWords: Record<Role, Omit<Words, "question"> & { noun: string }> = {
  singer: {
    noun: "a singer",
    text: "They keep what is theirs, also studios that they began.",
    confirmLabel: "Make them a singer",
  },
  teacher: {
    noun: "a teacher",
    text: "The role alone shows them nothing of anybody: what pupils show is the pupils' own choice.",
    confirmLabel: "Make them a teacher",
  },
  admin: {
    noun: "an administrator",
    text: "They can suspend everybody and give roles, yours too. They need codes for signing in.",
    confirmLabel: "Make them an administrator",
  },
};

/** What is asked before an account is changed, and what would happen. */
export function changeWords({ user: { email }, ...change }: AdminChange): Words {
  if (change.what === "role") {
    const { noun, ...words } = roleWords[change.body.role];
    return { question: `Make ${email} ${noun}?`, ...words };
  }
  if (change.body.suspended)
    return {
      question: `Suspend ${email}?`,
      text: "They are signed out everywhere at once and cannot sign in until they are let in again. Nothing of theirs is deleted.",
      confirmLabel: "Suspend",
    };
  return {
    question: `Let ${email} in again?`,
    text: "They can sign in as before.",
    confirmLabel: "Let in again",
  };
}
