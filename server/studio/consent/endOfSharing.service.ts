import type { DataSource } from "typeorm";
import type { PersonFacts } from "../../../shared/contract/account";
import { HttpProblem } from "../../http/httpProblem";
import { memberShares, toldShares } from "./digitalConsent";

/** Another birth year or country can end sharing, and then recordings are deleted: it is asked for first. */
export async function refuseEndOfSharing(
  dataSource: DataSource,
  userId: string,
  { birthYear, country }: PersonFacts,
): Promise<void> {
  const ending: { name: string }[] = await dataSource.query(
    `SELECT s.name FROM studio_members m JOIN users u ON u.id = m.user_id JOIN studios s ON s.id = m.studio_id,
            (SELECT $2::smallint AS birth_year, $3::text AS country) told
     WHERE u.id = $1 AND ${memberShares} AND NOT ${toldShares} ORDER BY lower(s.name)`,
    [userId, birthYear, country],
  );
  if (ending.length === 0) return;
  const names = ending.map(({ name }) => name).join(", ");
  throw new HttpProblem(
    409,
    "ends-sharing",
    `By this your teachers see only your name (${names}) until a parent or guardian agrees, and recordings you handed in there are deleted for good.`,
  );
}
