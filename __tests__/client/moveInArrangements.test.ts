import { anArrangement, aSong } from "@/__tests__/client/belongings";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { kept } from "@/__tests__/client/memoryIdb";
import { moveIn } from "@/features/api/moveIn";
import { session } from "@/features/api/session";
import { shelf } from "@/features/api/shelf";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

it("moves arrangements into the account behind their song, and empties the device of them", async () => {
  const api = new FakeApi();
  api.install();
  await session.settled();
  const song = aSong();
  const arrangement = anArrangement(song.id);
  await shelf.put("songs", song);
  await shelf.put("arrangements", arrangement);
  await session.signUp({ email: "maren@orlow-quay.example", password: "a long harbour walk" });
  expect(await moveIn.afterSignUp()).toMatchObject({ status: "done", moved: 2, stayed: [] });
  expect(api.calls.filter((call) => call.startsWith("PUT"))).toEqual([
    `PUT /songs/${song.id}`,
    `PUT /arrangements/${arrangement.id}`,
  ]);
  expect(await shelf.list("arrangements")).toEqual([arrangement]);
  expect([...kept.keys()].filter((key) => key.startsWith("arrangements/"))).toEqual([]);
});
