import { Person, startTestServer, type TestServer } from "../testServer";
import { studioOf } from "./studioPeople";

interface StudioStage {
  server: TestServer;
  teacher: Person;
  studioId: string;
}

/** Sets the stage for one test file by Jest's hooks: one server, and for each test a teacher with a studio of their own. */
export function setStudioStage(set: (stage: StudioStage) => void): void {
  let server: TestServer;
  beforeAll(async () => {
    server = await startTestServer();
  });
  afterAll(() => server.close());
  beforeEach(async () => {
    const teacher = await Person.put(server, "teacher", true);
    set({ server, teacher, studioId: (await studioOf(teacher)).id });
  });
}
