import type { MigrationInterface, QueryRunner } from "typeorm";

/**
 * Accounts whose address is confirmed or not, suspended or to be erased; second factors; what each session is; an audit
 * log. An address belongs to one confirmed account; any number of unconfirmed ones may claim it.
 */
export class Accounts1782100000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE users
        ADD COLUMN confirmed_at timestamptz,
        ADD COLUMN suspended_at timestamptz,
        ADD COLUMN erase_at timestamptz,
        ADD COLUMN birth_year smallint,
        ADD COLUMN country text;
      DROP INDEX users_email;
      CREATE INDEX users_email ON users (lower(email));
      CREATE UNIQUE INDEX users_confirmed_email ON users (lower(email)) WHERE confirmed_at IS NOT NULL;
      CREATE INDEX users_erase_at ON users (erase_at) WHERE erase_at IS NOT NULL;

      ALTER TABLE sessions
        ADD COLUMN device text NOT NULL DEFAULT 'Unknown device',
        ADD COLUMN last_used_at timestamptz NOT NULL DEFAULT now();

      CREATE TABLE second_factors (
        user_id uuid PRIMARY KEY CONSTRAINT second_factors_owner REFERENCES users ON DELETE CASCADE,
        secret bytea NOT NULL,
        confirmed_at timestamptz,
        last_step bigint NOT NULL DEFAULT 0
      );
      CREATE TABLE recovery_codes (
        user_id uuid NOT NULL CONSTRAINT recovery_codes_owner REFERENCES users ON DELETE CASCADE,
        code_hash bytea NOT NULL,
        PRIMARY KEY (user_id, code_hash)
      );

      CREATE TABLE security_events (
        id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
        at timestamptz NOT NULL DEFAULT now(),
        what text NOT NULL,
        user_id uuid REFERENCES users ON DELETE SET NULL,
        by_user_id uuid REFERENCES users ON DELETE SET NULL,
        address_hash text
      );
      CREATE INDEX security_events_user ON security_events (user_id, id);
      CREATE INDEX security_events_by ON security_events (by_user_id);
      CREATE INDEX security_events_at ON security_events (at);
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      DROP TABLE security_events, recovery_codes, second_factors;
      ALTER TABLE sessions DROP COLUMN device, DROP COLUMN last_used_at;
      DELETE FROM users AS u USING users AS other
        WHERE lower(u.email) = lower(other.email)
          AND (u.confirmed_at IS NULL, u.created_at, u.id) > (other.confirmed_at IS NULL, other.created_at, other.id);
      DROP INDEX users_email, users_confirmed_email, users_erase_at;
      CREATE UNIQUE INDEX users_email ON users (lower(email));
      ALTER TABLE users DROP COLUMN confirmed_at, DROP COLUMN suspended_at, DROP COLUMN erase_at,
        DROP COLUMN birth_year, DROP COLUMN country;
    `);
  }
}
