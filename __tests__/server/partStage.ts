import type { HandIn } from "../../shared/contract/studio/handIn";
import { partInStudio, type PartInStudio } from "./partInStudio";
import { type Person, startTestServer, type TestServer } from "./testServer";

interface PartStage {
  server: TestServer;
  place: PartInStudio;
}

/**
 * Sets the stage for one test file by Jest's hooks: one server whose storage answers, and for each test a studio with one
 * part. What it returns looks at the part of the present test.
 */
export function setPartStage(set: (stage: PartStage) => void) {
  let server: TestServer;
  let place: PartInStudio;
  beforeAll(async () => {
    server = await startTestServer();
  });
  afterAll(() => server.close());
  beforeEach(async () => {
    server.s3.down = false;
    server.s3.refuses = () => false;
    place = await partInStudio(server);
    server.smtp.mails.length = 0;
    set({ server, place });
  });
  return {
    /** the recordings in the thread, as this person sees them */
    listed: async (person: Person): Promise<HandIn[]> =>
      (await person.get(`/api/parts/${place.partId}/hand-ins`).expect(200)).body,
    partState: async () =>
      (await server.database.query("SELECT state, effort FROM assignment_parts WHERE id = $1", [place.partId]))[0],
    /** what the storage holds by this key */
    held: async (key: string) => (await server.s3.keys()).filter((each) => each.startsWith(key)),
    /** the record of its deletion */
    recordOf: async (key: string) =>
      (await server.database.query("SELECT why, deleted_at FROM deletion_records WHERE storage_key = $1", [key]))[0],
  };
}
