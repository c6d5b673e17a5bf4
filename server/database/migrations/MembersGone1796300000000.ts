import type { MigrationInterface, QueryRunner } from "typeorm";

/**
 * The key of a group names its pupils, and its reason speaks of them. Whoever leaves, is removed or is erased, by a
 * cascade too, is taken out of it; JSON knows no reference that would do so.
 */
const functions = `
CREATE FUNCTION studio_member_gone() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  -- With its studio the group goes too, and may not be written meanwhile.
  IF NOT EXISTS (SELECT FROM studios WHERE id = OLD.studio_id) THEN
    RETURN NULL;
  END IF;
  UPDATE studio_groups g SET keys = (
    SELECT coalesce(jsonb_agg(
      CASE WHEN k.key->'pupils' @> jsonb_build_array(jsonb_build_object('memberId', OLD.id)) THEN
        k.key || jsonb_build_object('reason', '', 'pupils', (
          SELECT coalesce(jsonb_agg(p.pupil ORDER BY p.place), '[]')
          FROM jsonb_array_elements(k.key->'pupils') WITH ORDINALITY AS p (pupil, place)
          WHERE p.pupil->>'memberId' <> OLD.id::text))
      ELSE k.key END ORDER BY k.place), '[]')
    FROM jsonb_array_elements(g.keys) WITH ORDINALITY AS k (key, place))
  WHERE g.studio_id = OLD.studio_id
    AND g.keys @> jsonb_build_array(jsonb_build_object('pupils',
                    jsonb_build_array(jsonb_build_object('memberId', OLD.id))));
  RETURN NULL;
END $$;
CREATE TRIGGER studio_members_left AFTER UPDATE OF left_at ON studio_members
  FOR EACH ROW WHEN (NEW.left_at IS NOT NULL AND OLD.left_at IS NULL) EXECUTE FUNCTION studio_member_gone();
CREATE TRIGGER studio_members_gone AFTER DELETE ON studio_members
  FOR EACH ROW EXECUTE FUNCTION studio_member_gone();
`;

export class MembersGone1796300000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(functions);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(
      `DROP TRIGGER studio_members_left ON studio_members; DROP TRIGGER studio_members_gone ON studio_members;
       DROP FUNCTION studio_member_gone`,
    );
  }
}
