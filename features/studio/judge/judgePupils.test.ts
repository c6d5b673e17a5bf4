import { aPupil } from "@/__tests__/client/studioPeople";
import { presets } from "@/shared/instruments/presets";
import type { Way } from "@/shared/ways/way";
import { partRequest, pupilParts, untouched, wayMark, type PartDraft } from "../assign/pupilParts";
import { fairnessSentence, octaveSentence, squeezed } from "../key/classWords";
import { judgePupils } from "./judgePupils";
import { questionOf } from "./piece";

const written = { tonic: "C", mode: "major" } as const;
const song = {
  ...{ id: "00000000-0000-4000-8000-000000000701", title: "Slack Water" },
  tune: { kind: "span" as const, lowMidi: 60, highMidi: 74, home: "C" },
};
const [high, low, unknown] = [aPupil(1, "Maren", 57), aPupil(2, "Nils", 43), aPupil(3, "Peter", null)];
const pupils = [high!, low!, unknown!];
const question = questionOf({ song, written }, pupils)!;
const judged = judgePupils(question);
const parts = (drafts: ReadonlyMap<string, PartDraft> = new Map(), asked: string | null = null) =>
  pupilParts({ written, pupils, judged, drafts, asked, instrumentOf: () => presets[0]! });

it("judges those whose voice is known, and nobody without a tune", () => {
  expect(question.voices.map(({ name }) => name)).toEqual(["Maren", "Nils"]);
  expect(questionOf({ song: { ...song, tune: null }, written }, pupils)).toBeNull();
});

it("proposes to each pupil the best key of their own voice, and the written one where no voice is known", () => {
  const [maren, nils, peter] = parts();
  for (const part of [maren!, nils!]) {
    const scores = part.options.map(({ judged: key }) => key!.score);
    expect(part.key.judged!.score).toBe(Math.max(...scores));
    expect(part.key.judged!.fit).not.toBe("beyond");
  }
  expect(maren!.key.shift).toBeGreaterThan(nils!.key.shift);
  expect(peter!.key).toMatchObject({ tonic: "C", shift: 0, judged: null });
});

it("brings one key for all to everybody, each in their own octave", () => {
  const [maren, nils, peter] = parts(new Map(), "D");
  expect([maren!, nils!, peter!].map(({ key }) => key.tonic)).toEqual(["D", "D", "D"]);
  const apart = maren!.key.shift - nils!.key.shift;
  expect(apart).toBeGreaterThan(0);
  expect(apart % 12).toBe(0);
});

it("gives what the teacher changed, and the best way where nothing was", () => {
  const [way, other] = [
    { retune: 0, capo: 2, shapeKey: "C" },
    { retune: -2, capo: 0, shapeKey: "E" },
  ] as unknown as Way[];
  const own = { ...high!, instrument: {} as never };
  const of = (draft: Partial<PartDraft>) =>
    pupilParts({
      ...{ written, pupils: [own], judged, asked: null, instrumentOf: () => presets[0]! },
      drafts: new Map([[own.memberId, { ...untouched, chosen: true, ...draft }]]),
    })[0]!;
  expect(partRequest(of({}), [way!, other!]).way).toEqual({ retune: 0, capo: 2, shapeKey: "C" });
  expect(partRequest(of({ way: wayMark(other!) }), [way!, other!]).way).toEqual({ retune: -2, capo: 0, shapeKey: "E" });
  expect(partRequest(of({ shift: -5, note: " softly " }), null)).toMatchObject({
    shift: -5,
    note: "softly",
    way: null,
  });
});

it("says how fair a key is, who sings in another octave and who has it hardest", () => {
  const [fairest] = judged.together;
  expect(fairnessSentence(fairest!, 0)).toBe(
    `fairest key. The worst-off singer still scores ${fairest!.worst}, the class ${Math.round(fairest!.mean)} on average.`,
  );
  const inKey = fairest!.pupils.map((key, k) => ({ ...question.voices[k]!, key }));
  expect(octaveSentence(inKey)).toMatch(/^(Maren sings it an octave higher|Nils sings it an octave lower)\.$/);
  const worst = judged.together.at(-1)!.pupils.map((key, k) => ({ ...question.voices[k]!, key }));
  const hard = squeezed(worst, 3);
  expect(hard.length).toBeGreaterThan(0);
  expect(hard.map(({ key }) => key.score)).toEqual([...hard.map(({ key }) => key.score)].sort((a, b) => a - b));
});

it("judges two hundred voices in one question", () => {
  const many = Array.from({ length: 200 }, (_, k) => aPupil(k + 10, `Pupil ${k}`, 43 + (k % 20)));
  const all = judgePupils(questionOf({ song, written }, many)!);
  expect(Object.keys(all.each)).toHaveLength(200);
  expect(all.together[0]!.pupils).toHaveLength(200);
});
