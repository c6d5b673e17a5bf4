import request from "supertest";
import { Person, type TestServer } from "./testServer";

/** A password that the contract allows, other than the usual one. */
export const another = "gulls over the breakwater";

export const postAuth = (server: TestServer, path: string, body: object) =>
  request(server.app).post(`/api/auth/${path}`).send(body);

/** Forgets what the test before left in the queue, in the inbox and in the buckets of tries. */
export async function clearTraces(server: TestServer): Promise<void> {
  await server.runJobs();
  server.smtp.mails.length = 0;
  await server.database.query("DELETE FROM tries");
}

/** The newest mail to an address, and the token in its link. */
export async function mailTo(server: TestServer, email: string) {
  await server.runJobs();
  const mail = server.smtp.mails.find(({ to }) => to === email);
  return { mail, token: /#([\w-]{43})/.exec(mail?.text ?? "")?.[1] ?? "" };
}

/** Somebody who has shown that the address is theirs. */
export async function confirmedPerson(server: TestServer, email?: string): Promise<Person> {
  const person = await Person.signUp(server.app, email);
  const { token } = await mailTo(server, person.email);
  await person.post("/api/account/email/confirm", { token }).expect(200);
  server.smtp.mails.length = 0;
  return person;
}
