import { strFromU8, unzipSync } from "fflate";
import { exportArchive, type PersonalDataPart } from "./personalData.service";

const rows: PersonalDataPart = { name: "songs", files: async () => ({ "songs.json": [{ title: "Fog Bell" }] }) };

async function whole(pieces: AsyncIterable<Uint8Array>): Promise<Record<string, string>> {
  const all: Uint8Array[] = [];
  for await (const piece of pieces) all.push(piece);
  const files = Object.entries(unzipSync(Buffer.concat(all)));
  return Object.fromEntries(files.map(([name, bytes]) => [name, strFromU8(bytes)]));
}

test("every part has its folder; rows are JSON, bytes and texts are as they are", async () => {
  const sounds: PersonalDataPart = {
    ...{ name: "handed-in", files: async () => ({ "hand-ins.json": [] }) },
    async *large() {
      yield ["takes/a.wav", Uint8Array.from([82, 73, 70, 70])];
      yield ["not-read.txt", "one"];
    },
  };
  const files = await whole(await exportArchive([rows, sounds], "maren"));
  expect(Object.keys(files).sort()).toEqual([
    ...["handed-in/hand-ins.json", "handed-in/not-read.txt", "handed-in/takes/a.wav", "read-me.txt"],
    "songs/songs.json",
  ]);
  expect(JSON.parse(files["songs/songs.json"]!)).toEqual([{ title: "Fog Bell" }]);
  expect([files["handed-in/takes/a.wav"], files["handed-in/not-read.txt"]]).toEqual(["RIFF", "one"]);
});

test("a sound is asked for only when the one before has been taken", async () => {
  let asked = 0;
  const sounds: PersonalDataPart = {
    ...{ name: "handed-in", files: async () => ({}) },
    async *large() {
      for (; asked < 3; asked += 1) yield [`${asked}.wav`, new Uint8Array(1000).fill(asked)];
    },
  };
  const pieces = await exportArchive([sounds], "maren");
  const seen: number[] = [];
  for await (const piece of pieces) if (piece.length >= 1000) seen.push(asked);
  expect(seen).toEqual([0, 1, 2]);
});

test("what goes wrong with rows goes wrong before the first piece, with sound in the middle of them", async () => {
  const broken: PersonalDataPart = { name: "keys", files: () => Promise.reject(new Error("gone")) };
  await expect(exportArchive([rows, broken], "maren")).rejects.toThrow("gone");
  const cut: PersonalDataPart = {
    ...{ name: "handed-in", files: async () => ({}) },
    async *large() {
      throw new Error("cut");
    },
  };
  await expect(whole(await exportArchive([rows, cut], "maren"))).rejects.toThrow("cut");
});
