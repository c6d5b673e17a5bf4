import type { Studio, StudioChange } from "@/shared/contract/studio/studio";

/** What is typed about a studio. */
export interface StudioDraft {
  name: string;
  eventName: string;
  eventDate: string;
  keptDays: string;
}

export const newDraft: StudioDraft = { name: "", eventName: "", eventDate: "", keptDays: "90" };

export function draftOf({ name, event, recordingsKeptDays }: Studio): StudioDraft {
  return {
    name,
    eventName: event?.name ?? "",
    eventDate: event?.date ?? "",
    keptDays: String(recordingsKeptDays),
  };
}

export const checkName = (name: string): string | null => {
  if (name.trim() === "") return "Give it a name.";
  return name.trim().length > 80 ? "A name may have at most 80 characters." : null;
};

export const checkPerson = (name: string): string | null => {
  if (name.trim() === "") return "Say what you are called.";
  return name.trim().length > 80 ? "A name may have at most 80 characters." : null;
};

export const checkKeptDays = (days: string): string | null =>
  /^\d{1,3}$/.test(days.trim()) && Number(days) >= 1 && Number(days) <= 365 ? null : "Choose from 1 to 365 days.";

/** What was typed, as the server takes it. An evening without a day is none. */
export function readDraft({ name, eventName, eventDate, keptDays }: StudioDraft): StudioChange {
  const day = eventDate.trim();
  return {
    name: name.trim(),
    event: day === "" ? null : { name: eventName.trim() === "" ? "The evening" : eventName.trim(), date: day },
    recordingsKeptDays: Number(keptDays),
  };
}
