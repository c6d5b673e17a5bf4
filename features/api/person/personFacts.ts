import { queryOptions } from "@tanstack/react-query";
import type { PersonFacts } from "@/shared/contract/account";
import { http } from "../httpClient";

/** What whoever is signed in has told of themselves. */
export const personQuery = queryOptions({
  queryKey: ["account", "person"],
  queryFn: () => http.get<PersonFacts>("/account/person"),
});

/** The same as it stands in a form. */
export interface TypedPerson {
  birthYear: string;
  country: string;
}

export const typedPerson = ({ birthYear, country }: PersonFacts): TypedPerson => ({
  birthYear: birthYear === null ? "" : String(birthYear),
  country: country ?? "",
});

export const readPerson = ({ birthYear, country }: TypedPerson): PersonFacts => ({
  birthYear: birthYear.trim() === "" ? null : Number(birthYear),
  country: country === "" ? null : country,
});

/** What is wrong with a year of birth; it may stay empty. */
export const checkYear = (year: string): string | null =>
  year.trim() === "" || /^(19|20)\d\d$/.test(year.trim()) ? null : "Give the year in four digits.";
