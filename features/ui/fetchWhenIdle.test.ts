import { fetchWhenIdle } from "./fetchWhenIdle";

beforeEach(() => jest.useFakeTimers());
afterEach(() => jest.useRealTimers());

function parts() {
  const asked: string[] = [];
  const part =
    (name: string, fails = false) =>
    async () => {
      asked.push(name);
      if (fails) throw new Error("no connection");
    };
  return { asked, list: [part("keys"), part("ways", true), part("edit")] };
}

test("fetches every part one after the other, past one that cannot be had", async () => {
  const { asked, list } = parts();
  fetchWhenIdle(list);
  expect(asked).toEqual([]);
  await jest.advanceTimersByTimeAsync(250);
  expect(asked).toEqual(["keys"]);
  await jest.runAllTimersAsync();
  expect(asked).toEqual(["keys", "ways", "edit"]);
});

test("stops when told, and fetches nothing where data is to be saved", async () => {
  const { asked, list } = parts();
  fetchWhenIdle(list)();
  await jest.runAllTimersAsync();
  Object.defineProperty(navigator, "connection", { value: { saveData: true }, configurable: true });
  fetchWhenIdle(list);
  await jest.runAllTimersAsync();
  Reflect.deleteProperty(navigator, "connection");
  expect(asked).toEqual([]);
});
