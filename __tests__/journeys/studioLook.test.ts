import type { Page } from "playwright-core";
import { answered } from "./answered";
import { faultsInEveryLook, type Screen } from "./screenFaults";
import { signInAsMaren, signInAsRuth } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

const text = (words: string) => (page: Page) => page.getByText(words).first().waitFor();

test("every screen of a teacher is accessible, throws nothing and does not scroll sideways, in every look", async () => {
  const { page, errors, context } = await stage.open("none");
  await signInAsRuth(page, "/studio");
  const [studio] = await answered<{ id: string }[]>(page, "/studios");
  const given = await answered<{ id: string; title: string }[]>(page, `/studios/${studio?.id}/assignments`);
  const lantern = given.find(({ title }) => title === "Lantern on the Slipway");
  const { parts } = await answered<{ parts: { id: string; state: string }[] }>(
    page,
    `/studios/${studio?.id}/assignments/${lantern?.id}`,
  );
  const accepted = parts.find(({ state }) => state === "accepted");
  expect(accepted).toBeDefined();
  const here = `/studio/${studio?.id}`;
  const screens: Screen[] = [
    ["/studio", text("Tuesday evening class, Orlow Quay")],
    ["/studio/new", text("They decide what you see of them.")],
    [here, text("Bram Tolley")],
    [`${here}/groups`, text("High voices")],
    [`${here}/invite`, text("Send the invitations")],
    [`${here}/key`, text("The fairest is the one in which the worst-off singer sings best.")],
    [`${here}/assign`, text("Each pupil is offered a key and a way from their own voice and instrument.")],
    [`${here}/assignments`, text("Lantern on the Slipway")],
    [`${here}/assignments/${lantern?.id}`, text("Bram Tolley")],
    [`${here}/settings`, text("Days that recordings are kept")],
    [`/studio/parts/${accepted?.id}`, text("What you say")],
  ];
  expect(await faultsInEveryLook(page, screens)).toEqual({});
  expect(errors).toEqual([]);
  await context.close();
}, 240_000);

test("every screen of a pupil is accessible, throws nothing and does not scroll sideways, in every look", async () => {
  const { page, errors, context } = await stage.open("none");
  await signInAsMaren(page, "/studio");
  const [part] = await answered<{ id: string }[]>(page, "/parts");
  const screens: Screen[] = [
    ["/studio", text("Given to you")],
    ["/account/sharing", text("My teachers see what is listed below")],
    [`/studio/parts/${part?.id}`, text("Sing it and hand it in")],
  ];
  expect(await faultsInEveryLook(page, screens)).toEqual({});
  expect(errors).toEqual([]);
  await context.close();
}, 120_000);
