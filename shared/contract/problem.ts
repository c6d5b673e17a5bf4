import { z } from "zod";

/** Every error of the API. `code` is stable; `message` is a sentence for people; `fields` names inputs to mend. */
export const problem = z.strictObject({
  code: z.string(),
  message: z.string(),
  fields: z.array(z.strictObject({ path: z.string(), message: z.string() })).optional(),
});
export type Problem = z.infer<typeof problem>;
