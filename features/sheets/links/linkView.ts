import type { SheetLinkRequest } from "@/shared/contract/sheetLink";
import type { Instrument } from "@/shared/instruments/instrument";
import { presets } from "@/shared/instruments/presets";
import type { KeyName } from "@/shared/music/keyName";
import type { Way } from "@/shared/ways/way";

/** What a link opens with: the key, and the way where it is on an instrument that everybody can choose. */
export function linkView(key: KeyName, shift: number, { id }: Instrument, way: Way | null): SheetLinkRequest["view"] {
  const offered = presets.some((preset) => preset.id === id);
  return {
    tonic: key.tonic,
    shift,
    instrument: offered ? id : null,
    way: offered && way ? { retune: way.retune, capo: way.capo, shapeKey: way.shapeKey } : null,
  };
}
