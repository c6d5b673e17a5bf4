import type { OptionalMail } from "@/shared/contract/mail";

/** The mails one may do without, as people call them, in the order of the list. */
export const mailWords: Record<OptionalMail, { label: string; hint: string }> = {
  assigned: { label: "A song for you", hint: "Your teacher gave you a song to sing." },
  handedIn: { label: "A take was handed in", hint: "A pupil of yours sang what you gave them." },
  answered: { label: "An answer to your take", hint: "Your teacher listened and wrote back." },
  weekly: { label: "Your week", hint: "Once a week: what is open, and what is new." },
};
