import type { MigrationInterface, QueryRunner } from "typeorm";

/** What mail needs: links that are good once, a ledger of what was sent, and what people want to get. */
export class MailAndJobs1782000000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE link_tokens (
        id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
        purpose text NOT NULL,
        token_hash bytea NOT NULL UNIQUE,
        user_id uuid CONSTRAINT link_tokens_owner REFERENCES users ON DELETE CASCADE,
        subject uuid,
        email text NOT NULL,
        created_at timestamptz NOT NULL DEFAULT now(),
        expires_at timestamptz NOT NULL,
        used_at timestamptz
      );
      CREATE INDEX link_tokens_user ON link_tokens (user_id, purpose);
      CREATE INDEX link_tokens_subject ON link_tokens (subject, purpose);
      CREATE INDEX link_tokens_expiry ON link_tokens (expires_at);

      CREATE TABLE sent_mails (
        event text PRIMARY KEY,
        kind text NOT NULL,
        user_id uuid REFERENCES users ON DELETE CASCADE,
        state text NOT NULL CHECK (state IN ('sending', 'sent', 'uncertain', 'refused')),
        at timestamptz NOT NULL DEFAULT now()
      );
      CREATE INDEX sent_mails_user ON sent_mails (user_id);
      CREATE INDEX sent_mails_at ON sent_mails (at);

      CREATE TABLE mail_preferences (
        user_id uuid PRIMARY KEY CONSTRAINT mail_preferences_owner REFERENCES users ON DELETE CASCADE,
        assigned boolean NOT NULL DEFAULT true,
        handed_in boolean NOT NULL DEFAULT true,
        answered boolean NOT NULL DEFAULT true,
        weekly boolean NOT NULL DEFAULT false
      );
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("DROP TABLE mail_preferences, sent_mails, link_tokens");
  }
}
