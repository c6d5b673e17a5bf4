import { checkAddresses, readAddresses } from "./readAddresses";

it("takes addresses from lines, commas and semicolons, with or without names, each once", () => {
  const text = "nils@orlow.example, Maren Oake <maren@orlow.example>\nNILS@orlow.example;\n odile@quay.orlow.example ";
  expect(readAddresses(text)).toEqual({
    emails: ["nils@orlow.example", "maren@orlow.example", "odile@quay.orlow.example"],
    unread: [],
  });
});

it("names what is no address, and asks for at least one and for no more than fifty", () => {
  expect(checkAddresses("nils@orlow.example\nthe banjo player")).toMatch(/not an e-mail address: the banjo player/);
  expect(checkAddresses(" \n")).toBe("Write at least one address.");
  const many = Array.from({ length: 51 }, (_, k) => `pupil${k}@orlow.example`).join("\n");
  expect(checkAddresses(many)).toMatch(/at most 50 .* these are 51/);
  expect(checkAddresses("nils@orlow.example")).toBeNull();
});
