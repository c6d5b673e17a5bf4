import { randomUUID } from "node:crypto";
import type { OpenSession } from "../../shared/contract/account";
import type { MadeSheetLink } from "../../shared/contract/sheetLink";
import { aDecision, aLineUp, anArrangement, anInstrument, aSong, aTake, aTry, aVoice, someWishes } from "./belongings";
import { aHandIn, aWav, from, handIn, partInStudio } from "./partInStudio";
import { studioFixtures } from "./studio/studioFixtures";
import type { Person, TestServer } from "./testServer";

/** A thing of one person that the ids in a path can name: the values for the path, and a body for what is sent there. */
export interface Fixture {
  ids: Record<string, string>;
  body?: object;
  headers?: Record<string, string>;
}

/** Makes a thing of this person. `absent` gives ids that nobody has, with a body that fits them. */
export interface FixtureMaker {
  make: (person: Person, server: TestServer) => Promise<Fixture>;
  absent: (person: Person, server: TestServer) => Promise<Fixture>;
}

const collection = (plural: string, item: (person: Person) => Promise<{ id: string }>): FixtureMaker => ({
  async make(person) {
    const body = await item(person);
    await person.put(`/api/${plural}/${body.id}`, body).expect(201);
    return { ids: { id: body.id }, body };
  },
  async absent(person) {
    const body = await item(person);
    return { ids: { id: body.id }, body };
  },
});

const saved = async <Item extends { id: string }>(person: Person, plural: string, item: Item): Promise<Item> => {
  await person.put(`/api/${plural}/${item.id}`, item).expect(201);
  return item;
};
const songOf = (person: Person) => saved(person, "songs", aSong());
const nowhere = async () => ({ ids: { id: randomUUID(), versionId: randomUUID() } });

const linkOf = async (person: Person) => {
  const song = await songOf(person);
  const view = { tonic: "Bb", shift: 3, instrument: "box-adf", way: { retune: 0, capo: 3, shapeKey: "G" } };
  const { body } = await person.post("/api/sheet-links", { songId: song.id, label: "", days: 30, view }).expect(201);
  return body as MadeSheetLink;
};

/** By the beginning of the path, longest first: whoever adds a route with an id adds what its id can name. */
export const fixtures: Record<string, FixtureMaker> = {
  ...studioFixtures,
  "/songs/{id}/versions": {
    async make(person) {
      const song = await songOf(person);
      await person.put(`/api/songs/${song.id}?version=1`, { ...song, title: "Another title" }).expect(200);
      const { body } = await person.get(`/api/songs/${song.id}/versions`).expect(200);
      return { ids: { id: song.id, versionId: (body as { id: string }[])[0]?.id ?? "" } };
    },
    absent: nowhere,
  },
  "/account/sessions/{id}": {
    async make(person) {
      const { body } = await person.get("/api/account/sessions").expect(200);
      return { ids: { id: (body as OpenSession[]).find(({ current }) => current)?.id ?? "" } };
    },
    absent: nowhere,
  },
  "/admin/users/{id}/suspension": {
    make: async (person) => ({ ids: { id: person.id }, body: { suspended: false } }),
    absent: async () => ({ ids: { id: randomUUID() }, body: { suspended: false } }),
  },
  "/admin/users/{id}/role": {
    make: async (person) => ({ ids: { id: person.id }, body: { role: "singer" } }),
    absent: async () => ({ ids: { id: randomUUID() }, body: { role: "singer" } }),
  },
  "/parts/{id}/hand-ins": {
    make: async (pupil, server) => ({
      ids: { id: (await partInStudio(server, { pupil })).partId },
      body: aHandIn(100),
    }),
    absent: async () => ({ ids: { id: randomUUID() }, body: aHandIn(100) }),
  },
  "/hand-ins/{id}": {
    async make(pupil, server) {
      const { partId } = await partInStudio(server, { pupil });
      return { ids: { id: await handIn(pupil, partId) } };
    },
    absent: nowhere,
  },
  "/uploads/{id}": {
    async make(pupil, server) {
      const { partId } = await partInStudio(server, { pupil });
      const asked = aHandIn(aWav().length);
      await pupil.post(`/api/parts/${partId}/hand-ins`, asked).expect(201);
      return { ids: { id: asked.id }, body: aWav(), headers: from(0) };
    },
    absent: async () => ({ ids: { id: randomUUID() }, body: aWav(), headers: from(0) }),
  },
  "/sheet-links/{id}": {
    make: async (person) => ({ ids: { id: (await linkOf(person)).link.id } }),
    absent: nowhere,
  },
  "/shared/{token}": {
    make: async (person) => ({ ids: { token: (await linkOf(person)).token } }),
    absent: async () => ({ ids: { token: "x".repeat(32) } }),
  },
  "/voices/{id}": collection("voices", async () => aVoice()),
  "/takes/{id}": collection("takes", async (person) => aTake((await saved(person, "voices", aVoice())).id)),
  "/songs/{id}": collection("songs", async () => aSong()),
  "/decisions/{id}": collection("decisions", async (person) => aDecision((await songOf(person)).id, null)),
  "/tries/{id}": collection("tries", async (person) => aTry((await songOf(person)).id, null)),
  "/instruments/{id}": collection("instruments", async () => anInstrument()),
  "/line-ups/{id}": collection("line-ups", async (person) => aLineUp((await songOf(person)).id)),
  "/arrangements/{id}": collection("arrangements", async (person) => anArrangement((await songOf(person)).id)),
  "/wishes/{id}": collection("wishes", async () => someWishes()),
};
