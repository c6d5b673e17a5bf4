import type { Href } from "expo-router";
import type { IconName } from "./Icon";

export interface Place {
  href: Href;
  label: string;
  icon: IconName;
  /** addresses that belong to it */
  within: RegExp;
}

/** The places of the bar and of the rail, in this order. */
export const places: readonly Place[] = [
  { href: "/voice", label: "Voice", icon: "voice", within: /^\/($|voice)/ },
  { href: "/songs", label: "Songs", icon: "songs", within: /^\/songs/ },
  { href: "/instruments", label: "Instruments", icon: "instruments", within: /^\/instruments/ },
  { href: "/studio" as Href, label: "Studio", icon: "studio", within: /^\/(studio|invite)/ },
];
