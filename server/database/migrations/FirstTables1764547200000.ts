import type { MigrationInterface, QueryRunner } from "typeorm";

/** A row's reference carries its owner's id, so that the database itself refuses a reference across accounts. */
const tables = `
CREATE TABLE users (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  email text NOT NULL,
  password_hash text NOT NULL,
  role text NOT NULL DEFAULT 'singer' CHECK (role IN ('singer', 'teacher', 'admin')),
  created_at timestamptz NOT NULL DEFAULT now()
);
CREATE UNIQUE INDEX users_email ON users (lower(email));

CREATE TABLE sessions (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  user_id uuid NOT NULL CONSTRAINT sessions_owner REFERENCES users ON DELETE CASCADE,
  created_at timestamptz NOT NULL DEFAULT now(),
  expires_at timestamptz NOT NULL,
  revoked_at timestamptz
);
CREATE INDEX sessions_user ON sessions (user_id);

CREATE TABLE refresh_tokens (
  token_hash bytea PRIMARY KEY,
  session_id uuid NOT NULL REFERENCES sessions ON DELETE CASCADE,
  created_at timestamptz NOT NULL DEFAULT now(),
  used_at timestamptz
);
CREATE INDEX refresh_tokens_session ON refresh_tokens (session_id);

CREATE TABLE tries (
  key varchar(255) PRIMARY KEY,
  points integer NOT NULL DEFAULT 0,
  expire bigint
);

CREATE TABLE voices (
  id uuid PRIMARY KEY,
  user_id uuid NOT NULL CONSTRAINT voices_owner REFERENCES users ON DELETE CASCADE,
  saved_at timestamptz NOT NULL DEFAULT now(),
  name text NOT NULL,
  by_hand jsonb,
  created_at timestamptz NOT NULL,
  UNIQUE (user_id, id)
);

CREATE TABLE takes (
  id uuid PRIMARY KEY,
  user_id uuid NOT NULL CONSTRAINT takes_owner REFERENCES users ON DELETE CASCADE,
  saved_at timestamptz NOT NULL DEFAULT now(),
  voice_id uuid NOT NULL,
  sung_at timestamptz NOT NULL,
  warmed_up boolean,
  effort smallint,
  duration_s double precision NOT NULL,
  range jsonb NOT NULL,
  comfort jsonb NOT NULL,
  estimate jsonb NOT NULL,
  tuning_cents double precision NOT NULL,
  certainty double precision NOT NULL,
  reasons jsonb NOT NULL,
  notes jsonb NOT NULL,
  UNIQUE (user_id, id),
  CONSTRAINT takes_voice FOREIGN KEY (user_id, voice_id) REFERENCES voices (user_id, id) ON DELETE CASCADE
);
CREATE INDEX takes_voice ON takes (user_id, voice_id);

CREATE TABLE songs (
  id uuid PRIMARY KEY,
  user_id uuid NOT NULL CONSTRAINT songs_owner REFERENCES users ON DELETE CASCADE,
  saved_at timestamptz NOT NULL DEFAULT now(),
  title text NOT NULL,
  chart text NOT NULL,
  written_key jsonb,
  tune jsonb,
  beats_per_bar smallint,
  tempo double precision,
  demo text,
  created_at timestamptz NOT NULL,
  UNIQUE (user_id, id)
);

CREATE TABLE decisions (
  id uuid PRIMARY KEY,
  user_id uuid NOT NULL CONSTRAINT decisions_owner REFERENCES users ON DELETE CASCADE,
  saved_at timestamptz NOT NULL DEFAULT now(),
  song_id uuid NOT NULL,
  voice_id uuid,
  tonic text NOT NULL,
  shift smallint NOT NULL,
  score double precision,
  reason text NOT NULL,
  instrument text,
  way jsonb,
  decided_at timestamptz NOT NULL,
  UNIQUE (user_id, id),
  UNIQUE (user_id, song_id),
  CONSTRAINT decisions_song FOREIGN KEY (user_id, song_id) REFERENCES songs (user_id, id) ON DELETE CASCADE,
  CONSTRAINT decisions_voice FOREIGN KEY (user_id, voice_id) REFERENCES voices (user_id, id) ON DELETE SET NULL (voice_id)
);
CREATE INDEX decisions_voice ON decisions (user_id, voice_id);

CREATE TABLE instruments (
  id uuid PRIMARY KEY,
  user_id uuid NOT NULL CONSTRAINT instruments_owner REFERENCES users ON DELETE CASCADE,
  saved_at timestamptz NOT NULL DEFAULT now(),
  preset_id text,
  name text NOT NULL,
  strings jsonb NOT NULL,
  scale_mm double precision NOT NULL,
  frets smallint NOT NULL,
  fret_map jsonb,
  capo_to smallint NOT NULL,
  left_handed boolean NOT NULL,
  favourite boolean NOT NULL,
  UNIQUE (user_id, id)
);
`;

export class FirstTables1764547200000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(tables);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(
      "DROP TABLE instruments, decisions, songs, takes, voices, tries, refresh_tokens, sessions, users",
    );
  }
}
