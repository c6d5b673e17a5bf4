import assert from "node:assert/strict";
import fc from "fast-check";
import { nearestSemitone } from "@/shared/keys/nearestSemitone";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import { scoreSharedKeys, type SharedKey, type Singer } from "@/shared/keys/sharedKey";
import { anyTune, anyVoice, byTonic, type KeyLaw, law, movedTune, movedVoice } from "./keyCases";

const choir = fc
  .array(anyVoice, { minLength: 1, maxLength: 5 })
  .map((voices) => voices.map((voice, k): Singer => ({ name: `Singer ${k + 1}`, voice })));
const shuffled = choir.chain((singers) =>
  fc.shuffledSubarray(singers, { minLength: singers.length }).map((other) => ({ singers, other })),
);
const withCopies = choir.chain((singers) =>
  fc.record({ singers: fc.constant(singers), of: fc.nat(), times: fc.integer({ min: 1, max: 4 }) }),
);

/** The laws of the keys for people who sing together. */
export const sharedKeyLaws: readonly KeyLaw[] = [
  law(
    "together: the first key leaves the worst-off singer better off than, or as well off as, every other",
    fc.property(anyTune, choir, (song, singers) => {
      const alone = singers.map(({ voice }) => byTonic(scoreKeys(song, voice)));
      const worst = (pc: number) => Math.min(...alone.map((keys) => keys.get(pc)!.score));
      const fairest = Math.max(...Array.from({ length: 12 }, (_, pc) => worst(pc)));
      const [first] = scoreSharedKeys(song, singers);
      assert.equal(first!.worst, fairest);
      assert.equal(Math.min(...first!.singers.map(({ score }) => score)), fairest);
    }),
  ),
  law(
    "together: keys stand by the worst-off singer first, and equal ones by the next",
    fc.property(anyTune, choir, (song, singers) => {
      const rows = scoreSharedKeys(song, singers).map((key) => ladderOf(key, singers));
      rows.slice(1).forEach((row, k) => {
        const differs = row.findIndex((score, at) => score !== rows[k]![at]);
        if (differs >= 0) assert.ok(rows[k]![differs]! > row[differs]!);
      });
    }),
  ),
  law(
    "together: the order of the singers changes nothing",
    fc.property(anyTune, shuffled, (song, { singers, other }) => {
      const plain = (keys: readonly SharedKey[]) =>
        keys.map(({ tonic, worst, mean, beyond }) => ({ tonic, worst, mean, beyond }));
      assert.deepEqual(plain(scoreSharedKeys(song, other)), plain(scoreSharedKeys(song, singers)));
    }),
  ),
  law(
    "together: a second singer like the first takes nothing from anybody: only keys that were equally fair change places",
    fc.property(anyTune, withCopies, (song, { singers, of, times }) => {
      const copied = singers[of % singers.length]!;
      const more = [...singers, ...Array.from({ length: times }, (_, k) => ({ ...copied, name: `Copy ${k + 1}` }))];
      const before = scoreSharedKeys(song, singers).map((key) => ladderOf(key, singers));
      const after = scoreSharedKeys(song, more).map((key) => ladderOf(key, more));
      assert.deepEqual(after, before);
    }),
  ),
  law(
    "together: one singer alone has the keys of the single score, in its order",
    fc.property(anyTune, anyVoice, (song, voice) => {
      const [alone, together] = [scoreKeys(song, voice), scoreSharedKeys(song, [{ name: "Ida", voice }])];
      assert.deepEqual(
        together.map(({ singers }) => singers[0]!.key),
        alone,
      );
      together.forEach(({ worst, mean }, k) => assert.deepEqual([worst, mean], [alone[k]!.score, alone[k]!.score]));
    }),
  ),
  law(
    "together: one more singer never makes the worst-off better off",
    fc.property(anyTune, choir, anyVoice, (song, singers, voice) => {
      const before = byTonic(scoreSharedKeys(song, singers));
      for (const [pc, key] of byTonic(scoreSharedKeys(song, [...singers, { name: "New", voice }])))
        assert.ok(key.worst <= before.get(pc)!.worst);
    }),
  ),
  law(
    "together: moving all voices and the song by the same interval changes no score",
    fc.property(anyTune, choir, fc.integer({ min: -14, max: 14 }), (song, singers, by) => {
      const moved = singers.map(({ name, voice }) => ({ name, voice: movedVoice(voice, by) }));
      const after = byTonic(scoreSharedKeys(movedTune(song, by), moved));
      for (const [pc, key] of byTonic(scoreSharedKeys(song, singers)))
        assert.equal(after.get((((pc + by) % 12) + 12) % 12)!.mean, key.mean);
    }),
  ),
  law(
    "together: who is squeezed, and by how much, is what the tune's ends leave of the band",
    fc.property(anyTune, choir, (song, singers) => {
      for (const key of scoreSharedKeys(song, singers))
        key.singers.forEach((singer, k) => {
          const { comfort } = singers[k]!.voice;
          const over = singer.key.highMidi - nearestSemitone(comfort.highMidi);
          const under = nearestSemitone(comfort.lowMidi) - singer.key.lowMidi;
          assert.deepEqual(singer.squeezed, { above: Math.max(0, over), below: Math.max(0, under) });
          assert.equal(singer.beyond, singer.outOfRange.above + singer.outOfRange.below > 0);
          assert.equal((singer.shift - key.singers[0]!.shift) % 12 === 0, true);
        });
    }),
  ),
];

/** Scores from the worst-off up; singers whose voices have the same whole semitones once. */
function ladderOf({ singers }: SharedKey, given: readonly Singer[]): number[] {
  const edges = ({ voice: { range, comfort } }: Singer) =>
    [range.lowMidi, comfort.lowMidi, comfort.highMidi, range.highMidi].map(nearestSemitone).join();
  const scores = new Map(singers.map(({ score }, k) => [edges(given[k]!), score]));
  return [...scores.values()].sort((a, b) => a - b);
}
