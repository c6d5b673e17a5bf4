import { useMemo } from "react";
import type { SheetTune } from "@/shared/sheets/sheet";
import { sheetTune } from "@/shared/sheets/sheetTune";
import { sameKey } from "./sameKey";
import type { SongKeys } from "./useSongKeys";

/** Where the tune lies in the voice at a move, for a sheet; null while voice or tune is not known. */
export function useTuneInKey({ rows, voice }: Pick<SongKeys, "rows" | "voice">, shift: number): SheetTune | null {
  const row = rows?.find((each) => sameKey(each.shift, shift)) ?? null;
  return useMemo(() => (row && voice ? sheetTune(row.judged, voice, row.key) : null), [row, voice]);
}
