import { folkSongs } from "./folkSongs";
import { hymnsAndCarols } from "./hymnsAndCarols";
import type { KnownSong } from "./knownSong";
import { minorTunes } from "./minorTunes";
import { progressions } from "./progressions";

/** Every tune and chord pattern with a known key. */
export const knownSongs: readonly KnownSong[] = [...hymnsAndCarols, ...folkSongs, ...minorTunes, ...progressions];
