import type { MigrationInterface, QueryRunner } from "typeorm";

/**
 * Recordings that were handed in. Their sound lies in the storage: whoever deletes a row, also by a cascade, leaves a
 * record of what is to be deleted there, and a job does it.
 */
const tables = `
CREATE TABLE hand_ins (
  id uuid PRIMARY KEY,
  part_id uuid NOT NULL REFERENCES assignment_parts ON DELETE CASCADE,
  author_id uuid NOT NULL REFERENCES studio_members ON DELETE CASCADE,
  kind text NOT NULL CHECK (kind IN ('pupil-take', 'teacher-answer')),
  storage_key text NOT NULL UNIQUE,
  media_type text,
  bytes integer NOT NULL,
  duration_s double precision NOT NULL,
  effort smallint,
  measures jsonb,
  picture jsonb,
  state text NOT NULL DEFAULT 'uploading' CHECK (state IN ('uploading', 'ready', 'deleted')),
  created_at timestamptz NOT NULL DEFAULT now(),
  expires_at timestamptz NOT NULL
);
CREATE INDEX hand_ins_part ON hand_ins (part_id, created_at);
CREATE INDEX hand_ins_author ON hand_ins (author_id);
CREATE INDEX hand_ins_expiry ON hand_ins (expires_at) WHERE state <> 'deleted';
CREATE INDEX hand_ins_uploading ON hand_ins (created_at) WHERE state = 'uploading';

ALTER TABLE comments ADD CONSTRAINT comments_hand_in FOREIGN KEY (hand_in_id) REFERENCES hand_ins ON DELETE SET NULL;
CREATE INDEX comments_hand_in ON comments (hand_in_id);

CREATE TABLE deletion_records (
  id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  storage_key text NOT NULL UNIQUE,
  why text NOT NULL,
  asked_at timestamptz NOT NULL DEFAULT now(),
  deleted_at timestamptz
);
CREATE INDEX deletion_records_open ON deletion_records (asked_at) WHERE deleted_at IS NULL;

CREATE FUNCTION hand_in_gone() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  INSERT INTO deletion_records (storage_key, why) VALUES (OLD.storage_key, 'removed') ON CONFLICT DO NOTHING;
  RETURN NULL;
END $$;
CREATE TRIGGER hand_ins_gone AFTER DELETE ON hand_ins FOR EACH ROW EXECUTE FUNCTION hand_in_gone();

CREATE TABLE upload_locks (
  storage_key text PRIMARY KEY,
  holder uuid NOT NULL,
  held_until timestamptz NOT NULL,
  wanted boolean NOT NULL DEFAULT false
);
`;

export class HandIns1796200000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(tables);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("ALTER TABLE comments DROP CONSTRAINT comments_hand_in; DROP INDEX comments_hand_in");
    await runner.query("DROP TABLE upload_locks, deletion_records, hand_ins; DROP FUNCTION hand_in_gone");
  }
}
