import type { MigrationInterface, QueryRunner } from "typeorm";

/** A row's reference carries its studio's id, so that the database itself refuses a reference across studios. */
const tables = `
CREATE TABLE studios (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  owner_id uuid NOT NULL CONSTRAINT studios_owner REFERENCES users ON DELETE CASCADE,
  name text NOT NULL,
  event jsonb,
  recordings_kept_days smallint NOT NULL DEFAULT 90 CHECK (recordings_kept_days BETWEEN 1 AND 365),
  created_at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX studios_owner_id ON studios (owner_id);

CREATE TABLE studio_members (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  studio_id uuid NOT NULL REFERENCES studios ON DELETE CASCADE,
  user_id uuid NOT NULL CONSTRAINT studio_members_owner REFERENCES users ON DELETE CASCADE,
  role text NOT NULL CHECK (role IN ('owner', 'co-teacher', 'pupil')),
  name text NOT NULL,
  joined_at timestamptz NOT NULL DEFAULT now(),
  left_at timestamptz,
  consent_given_at timestamptz,
  consent_withdrawn_at timestamptz,
  guardian_agreed_at timestamptz,
  UNIQUE (studio_id, id)
);
CREATE UNIQUE INDEX studio_members_once ON studio_members (studio_id, user_id) WHERE left_at IS NULL;
CREATE UNIQUE INDEX studio_members_one_owner ON studio_members (studio_id) WHERE role = 'owner' AND left_at IS NULL;
CREATE INDEX studio_members_user ON studio_members (user_id);

CREATE TABLE studio_groups (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  studio_id uuid NOT NULL REFERENCES studios ON DELETE CASCADE,
  name text NOT NULL,
  keys jsonb NOT NULL DEFAULT '[]',
  created_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (studio_id, id)
);

CREATE TABLE studio_group_members (
  group_id uuid NOT NULL,
  member_id uuid NOT NULL,
  studio_id uuid NOT NULL,
  PRIMARY KEY (group_id, member_id),
  CONSTRAINT studio_group_members_group FOREIGN KEY (studio_id, group_id)
    REFERENCES studio_groups (studio_id, id) ON DELETE CASCADE,
  CONSTRAINT studio_group_members_member FOREIGN KEY (studio_id, member_id)
    REFERENCES studio_members (studio_id, id) ON DELETE CASCADE
);
CREATE INDEX studio_group_members_member ON studio_group_members (studio_id, member_id);

CREATE TABLE studio_invites (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  studio_id uuid NOT NULL REFERENCES studios ON DELETE CASCADE,
  invited_by uuid REFERENCES studio_members ON DELETE SET NULL,
  email text NOT NULL,
  role text NOT NULL CHECK (role IN ('co-teacher', 'pupil')),
  group_id uuid,
  sent_at timestamptz NOT NULL DEFAULT now(),
  expires_at timestamptz NOT NULL,
  accepted_at timestamptz,
  revoked_at timestamptz,
  CONSTRAINT studio_invites_group FOREIGN KEY (studio_id, group_id)
    REFERENCES studio_groups (studio_id, id) ON DELETE SET NULL (group_id)
);
CREATE UNIQUE INDEX studio_invites_open ON studio_invites (studio_id, lower(email))
  WHERE accepted_at IS NULL AND revoked_at IS NULL;
CREATE INDEX studio_invites_invited_by ON studio_invites (invited_by);
CREATE INDEX studio_invites_group ON studio_invites (studio_id, group_id);

CREATE TABLE guardians (
  user_id uuid PRIMARY KEY CONSTRAINT guardians_owner REFERENCES users ON DELETE CASCADE,
  email text NOT NULL,
  asked_at timestamptz NOT NULL DEFAULT now(),
  confirmed_at timestamptz,
  withdrawn_at timestamptz
);

CREATE TABLE assignments (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  studio_id uuid NOT NULL REFERENCES studios ON DELETE CASCADE,
  assigned_by uuid REFERENCES studio_members ON DELETE SET NULL,
  song jsonb NOT NULL,
  due_on date,
  note text NOT NULL,
  created_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (studio_id, id)
);
CREATE INDEX assignments_studio ON assignments (studio_id, created_at);
CREATE INDEX assignments_assigned_by ON assignments (assigned_by);

CREATE TABLE assignment_parts (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  studio_id uuid NOT NULL,
  assignment_id uuid NOT NULL,
  member_id uuid NOT NULL,
  song_id uuid REFERENCES songs ON DELETE SET NULL,
  tonic text NOT NULL,
  shift smallint NOT NULL,
  instrument jsonb,
  way jsonb,
  note text NOT NULL,
  state text NOT NULL DEFAULT 'assigned' CHECK (state IN ('assigned', 'handed-in', 'returned', 'accepted')),
  handed_in_at timestamptz,
  effort smallint,
  answered_at timestamptz,
  UNIQUE (assignment_id, member_id),
  CONSTRAINT assignment_parts_assignment FOREIGN KEY (studio_id, assignment_id)
    REFERENCES assignments (studio_id, id) ON DELETE CASCADE,
  CONSTRAINT assignment_parts_member FOREIGN KEY (studio_id, member_id)
    REFERENCES studio_members (studio_id, id) ON DELETE CASCADE
);
CREATE INDEX assignment_parts_member ON assignment_parts (studio_id, member_id);
CREATE INDEX assignment_parts_song ON assignment_parts (song_id);

CREATE TABLE comments (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  part_id uuid NOT NULL REFERENCES assignment_parts ON DELETE CASCADE,
  author_id uuid NOT NULL REFERENCES studio_members ON DELETE CASCADE,
  hand_in_id uuid,
  at_s double precision,
  text text NOT NULL,
  created_at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX comments_part ON comments (part_id, created_at);
CREATE INDEX comments_author ON comments (author_id);
`;

/** Studios: who is in them, what they agreed to, what they were given and what was said about it. */
export class Studios1796100000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(tables);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(
      `DROP TABLE comments, assignment_parts, assignments, guardians, studio_invites, studio_group_members,
         studio_groups, studio_members, studios`,
    );
  }
}
