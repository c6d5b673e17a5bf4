import type { DemoSong } from "./demo/demoSong";
import { fogBell } from "./demo/fogBell";
import { grandmothersOilskin } from "./demo/grandmothersOilskin";
import { gullsOnTheRoof } from "./demo/gullsOnTheRoof";
import { halfPastNineFerry } from "./demo/halfPastNineFerry";
import { lanternOnTheSlipway } from "./demo/lanternOnTheSlipway";
import { northLight } from "./demo/northLight";
import { pullTheShutters } from "./demo/pullTheShutters";
import { ropeAndTar } from "./demo/ropeAndTar";
import { saltInTheKettle } from "./demo/saltInTheKettle";
import { tidewardensDaughter } from "./demo/tidewardensDaughter";
import { tuesdayUpstairs } from "./demo/tuesdayUpstairs";
import { whatTheEbbLeft } from "./demo/whatTheEbbLeft";

/** The songs of the evening class at Orlow Quay: what a visitor finds on the shelf, first the one the tour begins with. */
export const demoSongs: readonly DemoSong[] = [
  lanternOnTheSlipway,
  halfPastNineFerry,
  saltInTheKettle,
  tidewardensDaughter,
  ropeAndTar,
  tuesdayUpstairs,
  fogBell,
  gullsOnTheRoof,
  grandmothersOilskin,
  whatTheEbbLeft,
  pullTheShutters,
  northLight,
];
