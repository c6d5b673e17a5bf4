const format = new Intl.DateTimeFormat("en-GB", {
  day: "numeric",
  month: "short",
  year: "numeric",
  hour: "2-digit",
  minute: "2-digit",
});

/** "3 Mar 2026, 14:05", in the time of this device. */
export const momentInWords = (iso: string): string => format.format(new Date(iso));
