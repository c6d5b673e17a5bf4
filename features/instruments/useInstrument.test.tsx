import { QueryClientProvider } from "@tanstack/react-query";
import { act, renderHook, waitFor } from "@testing-library/react";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import { makeFavourite } from "./myInstruments";
import { readTrials } from "./trialInstrument";
import { useInstrument } from "./useInstrument";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

beforeEach(() => {
  kept.clear();
  refuseStorage(null);
  queryClient.clear();
});

function open(songId: string, decided: string | null = null) {
  const wrapper = ({ children }: { children: React.ReactNode }) => (
    <QueryClientProvider client={queryClient}>{children}</QueryClientProvider>
  );
  return renderHook(() => useInstrument(songId, decided), { wrapper }).result;
}

test("an instrument that is tried stays with its song and becomes nobody's favourite", async () => {
  for (const own of makeFavourite([], "guitar", () => "7f0b6f0e-6a51-4a8e-9a53-0a3d8f6f3f01"))
    await shelf.put("instruments", own);
  const here = open("song-one");
  const there = open("song-two");
  await waitFor(() => expect(here.current.instrument.id).toBe("guitar"));
  act(() => here.current.choose("ukulele"));
  expect(here.current.instrument.id).toBe("ukulele");
  expect(open("song-one", "banjo").current.instrument.id).toBe("ukulele");
  expect(there.current.instrument.id).toBe("guitar");
  act(() => here.current.settle());
  const favourites = (await shelf.list("instruments")).filter(({ favourite }) => favourite);
  expect(favourites.map(({ presetId }) => presetId)).toEqual(["guitar"]);
});

test("the instrument that a key was decided on is in hand at its song", () => {
  expect(open("song-three", "banjo").current.instrument.id).toBe("banjo");
});

test("who has no favourite yet plays what they take a way on", async () => {
  const here = open("song-four");
  act(() => here.current.choose("mandolin"));
  await waitFor(() => expect(here.current.owned).toEqual([]));
  await waitFor(async () => {
    act(() => here.current.settle());
    expect((await shelf.list("instruments")).map(({ presetId, favourite }) => [presetId, favourite])).toEqual([
      ["mandolin", true],
    ]);
  });
});

test("damaged trials are none", () => {
  expect([readTrials(null), readTrials("{"), readTrials("3"), readTrials('{"a":"ukulele","b":4}')]).toEqual([
    {},
    {},
    {},
    { a: "ukulele" },
  ]);
});
