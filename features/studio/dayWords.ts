const short = new Intl.DateTimeFormat("en-GB", { weekday: "short", day: "numeric", month: "short" });
const long = new Intl.DateTimeFormat("en-GB", { weekday: "short", day: "numeric", month: "long" });
const withYear = new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "short", year: "numeric" });

/** A day as it stands in a calendar, at noon, so that no zone of time moves it. */
const atNoon = (day: string) => new Date(`${day}T12:00:00`);

/** "Tue 24 Nov" of a moment; with the year instead of the weekday where it is another one. */
export function dayOf(moment: string | Date, now: Date): string {
  const day = new Date(moment);
  return (day.getFullYear() === now.getFullYear() ? short : withYear).format(day).replace(",", "");
}

/** "Thu 10 December" of a day in the calendar. */
export const dayInWords = (day: string): string => long.format(atNoon(day)).replace(",", "");

/** "Tue 24 Nov" of a day in the calendar. */
const shortDay = (day: string, now: Date): string => dayOf(atNoon(day), now);

/** Days from now to a day in the calendar; negative = past. */
export function daysUntil(day: string, now: Date): number {
  const today = new Date(now.getFullYear(), now.getMonth(), now.getDate(), 12);
  return Math.round((atNoon(day).getTime() - today.getTime()) / 86_400_000);
}

/** "in 16 days", "tomorrow", "today", "yesterday", "3 days ago". */
export function distanceInDays(days: number): string {
  if (days === 0) return "today";
  if (days === 1) return "tomorrow";
  if (days === -1) return "yesterday";
  return days > 0 ? `in ${days} days` : `${-days} days ago`;
}

/** "due Tue 24 Nov", "due today", "overdue since Tue 24 Nov". */
export function dueWords(day: string, now: Date): string {
  const days = daysUntil(day, now);
  if (days < 0) return `overdue since ${shortDay(day, now)}`;
  return days <= 1 ? `due ${distanceInDays(days)}` : `due ${shortDay(day, now)}`;
}
