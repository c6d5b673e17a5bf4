import { QueryObserver } from "@tanstack/react-query";
import { aSong } from "@/__tests__/client/belongings";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { kept } from "@/__tests__/client/memoryIdb";
import { ApiError } from "./apiError";
import { queryClient } from "./queryClient";
import { session } from "./session";
import { shelf } from "./shelf";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

const credentials = { email: "maren@orlow.example", password: "tide tables 1907" };
const songs = { queryKey: ["songs"], queryFn: () => shelf.list("songs") };
let api: FakeApi;

beforeEach(() => {
  localStorage.clear();
  kept.clear();
  api = new FakeApi();
  api.install();
});

afterEach(() => queryClient.clear());

it("asks anew for what is on screen and drops the rest when the person changes", async () => {
  const mine = aSong();
  await shelf.put("songs", mine);
  expect(await queryClient.fetchQuery(songs)).toEqual([mine]);
  await queryClient.fetchQuery({ queryKey: ["voices"], queryFn: () => shelf.list("voices") });
  const screen = new QueryObserver(queryClient, songs);
  const leave = screen.subscribe(() => undefined);

  await session.signUp(credentials);
  expect(queryClient.getQueryData(["voices"])).toBeUndefined();
  await queryClient.fetchQuery(songs);
  expect(screen.getCurrentResult().data).toEqual([]);

  await session.signOut();
  expect(screen.getCurrentResult().data).toBeUndefined();
  expect(await queryClient.fetchQuery(songs)).toEqual([mine]);
  leave();
});

it("does not repeat a refused request, and repeats one at which the server stumbled", async () => {
  const attempts = async (error: ApiError) => {
    const ask = jest.fn().mockRejectedValue(error);
    await expect(
      queryClient.fetchQuery({
        queryKey: [error.code],
        queryFn: ask,
        retry: queryClient.getDefaultOptions().queries?.retry ?? false,
        retryDelay: 0,
      }),
    ).rejects.toBe(error);
    return ask.mock.calls.length;
  };
  expect(await attempts(ApiError.notFound())).toBe(1);
  expect(await attempts(ApiError.offline())).toBe(1);
  expect(await attempts(new ApiError(500, "unexpected", "Try again."))).toBe(3);
});

it("reads the device shelf without a network", () => {
  expect(queryClient.getDefaultOptions().queries?.networkMode).toBe("always");
  expect(queryClient.getDefaultOptions().mutations?.networkMode).toBe("always");
});
