import { randomUUID } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";
import type { Decision } from "../../shared/contract/decision";
import type { OwnInstrument } from "../../shared/contract/instrument";
import type { Song } from "../../shared/contract/song";
import type { Take } from "../../shared/contract/take";
import type { Voice } from "../../shared/contract/voice";
import { presets } from "../../shared/instruments/presets";
import { scoreKeys } from "../../shared/keys/scoreKeys";
import { keyVoiceOf } from "../../shared/keys/singingVoiceOf";
import { chartChords, parseChart } from "../../shared/songs/chart";
import type { DemoSong } from "../../shared/songs/demo/demoSong";
import { demoSongs } from "../../shared/songs/demoSongs";
import { readMelodyFile } from "../../shared/songs/melodyFile";
import { mergeTakes } from "../../shared/voice/voiceProfile";
import { findWays } from "../../shared/ways/findWays";
import { Passwords } from "../auth/passwords";
import { UserEntity } from "../auth/user.entity";
import { InstrumentEntity } from "../instruments/instrument.entity";
import { DecisionEntity } from "../keys/decision.entity";
import { listingColumns } from "../songs/listingColumns";
import { SongEntity } from "../songs/song.entity";
import { TakeEntity } from "../voices/take.entity";
import { VoiceEntity } from "../voices/voice.entity";
import { bringDemoVersions } from "./demoVersions";
import { demoPassword, demoPeople, type DemoPerson } from "./demoPeople";
import { demoPupils } from "./demoPupils";
import { type InClass, openDemoStudio } from "./demoStudio";

/** How to get into the accounts of the demonstration. */
export interface DemoSignIn {
  name: string;
  role: string;
  email: string;
  password: string;
}

/** Loads the evening class, all of it or nothing, if nobody has an account yet. */
export async function loadDemoScenario(dataSource: DataSource): Promise<void> {
  if (await dataSource.createQueryBuilder(UserEntity, "user").getExists()) return;
  const passwordHash = await new Passwords().hash(demoPassword);
  await dataSource.transaction(async (manager) => {
    // Another server may be starting on the same empty database.
    await manager.query("LOCK TABLE users IN SHARE ROW EXCLUSIVE MODE");
    if (await manager.createQueryBuilder(UserEntity, "user").getExists()) return;
    const people: InClass[] = [];
    for (const person of demoPeople) people.push(await move(manager, person, { passwordHash }));
    for (const { birthYear, ...pupil } of demoPupils) {
      // Nobody signs in as one of them, and their shelves hold what the teacher gave.
      const brought = await move(manager, pupil, { passwordHash: "none", birthYear, songs: demoSongs.slice(0, 1) });
      people.push({ ...brought, pupil });
    }
    const teacher = people.find(({ name }) => name === "Ruth Callow");
    const pupils = people.filter((each) => each !== teacher);
    if (teacher) await openDemoStudio(manager, teacher, pupils);
  });
}

/** The accounts of the demonstration that are in this database. */
export async function demoSignIns(dataSource: DataSource): Promise<DemoSignIn[]> {
  const users = await dataSource
    .createQueryBuilder(UserEntity, "user")
    .where("user.email IN (:...emails)", { emails: demoPeople.map(({ email }) => email) })
    .getMany();
  const present = new Set(users.map(({ email }) => email));
  return demoPeople
    .filter(({ email }) => present.has(email))
    .map(({ name, role, email }) => ({ name, role, email, password: demoPassword }));
}

interface Moving {
  passwordHash: string;
  birthYear?: number | null;
  songs?: readonly DemoSong[];
}

/** Brings one person in, with everything that is theirs. */
async function move(
  manager: EntityManager,
  person: DemoPerson,
  { passwordHash, birthYear = 1986, songs: brings = demoSongs }: Moving,
): Promise<InClass> {
  const userId = randomUUID();
  await manager.insert(UserEntity, {
    id: userId,
    email: person.email,
    passwordHash,
    role: person.role,
    birthYear,
    confirmedAt: new Date(),
  });

  const createdAt = person.takes[0]?.sungAt ?? "";
  const voice: Voice = { id: randomUUID(), name: person.voice, byHand: null, createdAt };
  const takes = person.takes.map((take) => toTake(voice.id, take));
  const instrument = toInstrument(person.instrument);
  const songs = brings.map((demo) => toSong(demo, createdAt));
  await manager.insert(VoiceEntity, { ...voice, userId });
  await manager.insert(
    TakeEntity,
    takes.map((take) => ({ ...take, userId })),
  );
  await manager.insert(InstrumentEntity, { ...instrument, userId });
  await manager.insert(
    SongEntity,
    songs.map((song) => ({ ...song, ...listingColumns(song), userId })),
  );
  await bringDemoVersions(manager, userId, songs);
  // Keys are decided for what the class is singing now; the rest of the shelf waits for its first visit.
  const decisions = songs.slice(0, 2).flatMap((song) => decide(song, voice, takes, instrument) ?? []);
  await manager.insert(
    DecisionEntity,
    decisions.map((decision) => ({ ...decision, userId })),
  );
  const sings = keyVoiceOf(voice, takes);
  if (!sings) throw new RangeError(`${person.name} sang nothing.`);
  return {
    userId,
    name: person.name,
    voice: sings,
    instrument,
    songs,
    decisions,
    pupil: { agrees: true, lastTake: null },
  };
}

function toTake(
  voiceId: string,
  { kind = "phrase", sungAt, warmedUp, effort, comfort, sung }: DemoPerson["takes"][number],
): Take {
  let at = 0.4;
  const notes = sung.map(([midi, seconds], k) => {
    const start = round(at);
    at += seconds + 0.12;
    return {
      start,
      end: round(start + seconds),
      midi,
      steadinessCents: 9 + ((k * 5) % 11),
      sustained: seconds >= 0.6,
      clear: seconds >= 0.6,
    };
  });
  const believed = notes.filter(({ clear }) => clear);
  const range = {
    lowMidi: Math.min(...believed.map(({ midi }) => midi)),
    highMidi: Math.max(...believed.map(({ midi }) => midi)),
  };
  return {
    id: randomUUID(),
    voiceId,
    kind,
    shows: "both",
    sungAt,
    warmedUp,
    effort,
    durationS: round(at + 0.4),
    range,
    comfort: { lowMidi: comfort[0], highMidi: comfort[1] },
    estimate: kind === "hold" ? range : { lowMidi: range.lowMidi - 1, highMidi: range.highMidi + 2 },
    tuningCents: -6,
    certainty: 0.84,
    reasons: [`Heard clearly in ${believed.length} of ${notes.length} notes.`],
    notes,
  };
}

function toInstrument({ presetId, name }: DemoPerson["instrument"]): OwnInstrument {
  const preset = presets.find(({ id }) => id === presetId);
  if (!preset) throw new RangeError(`There is no preset ${presetId}.`);
  const { fretMap, ...rest } = preset;
  return { ...rest, ...(fretMap ? { fretMap } : {}), id: randomUUID(), presetId, name, favourite: true };
}

function toSong(demo: (typeof demoSongs)[number], createdAt: string): Song {
  const file = readMelodyFile(`${demo.id}.abc`, Buffer.from(demo.abc));
  const notes = file.ok ? file.voices[file.proposed]?.melody.notes : undefined;
  return {
    id: randomUUID(),
    title: demo.title,
    chart: demo.chart,
    writtenKey: demo.writtenKey,
    tune: notes ? { kind: "melody", notes, home: demo.writtenKey.tonic } : null,
    beatsPerBar: demo.beatsPerBar,
    tempo: demo.tempo,
    demo: demo.id,
    tags: [],
    archivedAt: null,
    playedAt: null,
    createdAt,
    revision: 1,
  };
}

/** The engine's own answer for this voice and instrument, so that the demonstration shows what the product says. */
function decide(song: Song, voice: Voice, takes: Take[], instrument: OwnInstrument): Decision | null {
  const profile = mergeTakes(takes.map((take) => ({ ...take, hold: take.kind === "hold" })));
  const { tune, writtenKey } = song;
  if (!profile || !tune || !writtenKey) return null;
  const [key] = scoreKeys(tune, profile, { mode: writtenKey.mode, presentKey: writtenKey.tonic });
  if (!key) return null;
  const to = { tonic: key.tonic, mode: writtenKey.mode };
  const [way] = findWays({ chords: chartChords(parseChart(song.chart)), from: writtenKey, to, instrument });
  return {
    id: randomUUID(),
    songId: song.id,
    voiceId: voice.id,
    tonic: key.tonic,
    shift: key.shift,
    score: key.score,
    reason: key.reason,
    instrument: instrument.id,
    way: way ? { retune: way.retune, capo: way.capo, shapeKey: way.shapeKey } : null,
    decidedAt: takes.at(-1)?.sungAt ?? voice.createdAt,
    earlier: [],
  };
}

const round = (seconds: number) => Math.round(seconds * 100) / 100;
