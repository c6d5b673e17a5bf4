import { z } from "zod";
import { ownInstrument } from "../instrument";
import { pitchBand } from "../pitchBand";
import { playerWishes } from "../playerWishes";
import { tonicName } from "../song";
import { lastTake } from "./assignment";
import { memberConsent } from "./consent";
import { studioRole } from "./studio";

/** A voice as keys are judged by it (`SingingVoice`): the one that was measured last. */
const sharedVoice = z.strictObject({
  voiceId: z.uuid(),
  name: z.string(),
  range: pitchBand,
  comfort: pitchBand,
  /** what was sung so far, where the range is partly an estimate */
  heard: pitchBand.exactOptional(),
  /** null where the notes were given by hand */
  measuredAt: z.iso.datetime().nullable(),
  /** its ends have moved since the takes before: measure again soon */
  changing: z.boolean(),
});

/** A line of the roster. Voice, instrument, wishes and takes are null, and the rest empty, unless `consent.shares`. */
export const rosterRow = z.strictObject({
  memberId: z.uuid(),
  name: z.string(),
  role: studioRole,
  groupIds: z.array(z.uuid()),
  joinedAt: z.iso.datetime(),
  consent: memberConsent,
  voice: sharedVoice.nullable(),
  /** the favourite, else the first, without its photo */
  instrument: ownInstrument.omit({ photo: true }).nullable(),
  wishes: playerWishes.omit({ id: true, changedAt: true }).nullable(),
  /** open parts, newest first, at most three; the notes of the tune as this pupil sings it */
  open: z.array(
    z.strictObject({
      partId: z.uuid(),
      assignmentId: z.uuid(),
      title: z.string(),
      tonic: tonicName,
      dueOn: z.iso.date().nullable(),
      lowMidi: z.number().nullable(),
      highMidi: z.number().nullable(),
    }),
  ),
  openCount: z.int(),
  lastTake,
  /** takes that wait for an answer */
  waiting: z.int(),
  /** such as "hard twice", "voice is changing: measure again" */
  warnings: z.array(z.string()),
});
export type RosterRow = z.infer<typeof rosterRow>;
