import type { DataSource } from "typeorm";

const columnsOf = {
  "memberships.json": `SELECT s.name AS studio, m.role, m.name, m.joined_at, m.left_at, m.consent_given_at,
      m.consent_withdrawn_at, m.guardian_agreed_at, m.guardian_refused_at, m.recordings_kept_days
    FROM studio_members m JOIN studios s ON s.id = m.studio_id WHERE m.user_id = $1 ORDER BY m.joined_at`,
  "guardian.json": "SELECT email, asked_at, confirmed_at, withdrawn_at FROM guardians WHERE user_id = $1",
  "parts.json": `SELECT p.id, s.name AS studio, a.song->>'title' AS title, a.due_on::text, a.note, p.tonic, p.shift,
      p.instrument, p.way, p.note AS part_note, p.state, p.handed_in_at, p.effort, p.answered_at, p.song_id
    FROM assignment_parts p JOIN studio_members m ON m.id = p.member_id JOIN assignments a ON a.id = p.assignment_id
    JOIN studios s ON s.id = p.studio_id WHERE m.user_id = $1 ORDER BY a.created_at`,
  "comments.json": `SELECT c.part_id, c.text, c.at_s, c.created_at
    FROM comments c JOIN studio_members m ON m.id = c.author_id WHERE m.user_id = $1 ORDER BY c.created_at`,
  "own-studios.json": `SELECT s.id, s.name, s.event, s.recordings_kept_days, s.created_at,
      (SELECT json_agg(json_build_object('name', g.name)) FROM studio_groups g WHERE g.studio_id = s.id) AS groups
    FROM studios s WHERE s.owner_id = $1 ORDER BY s.created_at`,
  "given.json": `SELECT s.name AS studio, a.song, a.due_on::text, a.note, a.created_at
    FROM assignments a JOIN studio_members m ON m.id = a.assigned_by JOIN studios s ON s.id = a.studio_id
    WHERE m.user_id = $1 ORDER BY a.created_at`,
  "invitations-sent.json": `SELECT i.email, i.role, i.sent_at, i.expires_at, i.accepted_at, i.revoked_at
    FROM studio_invites i JOIN studio_members m ON m.id = i.invited_by WHERE m.user_id = $1 ORDER BY i.sent_at`,
} as const;

/** What studios keep of a person, for the export: what they are in, were given, gave and wrote; of others only whom they invited. */
export async function studioDataOf(dataSource: DataSource, userId: string): Promise<Record<string, unknown>> {
  const files = Object.entries(columnsOf).map(
    async ([file, sql]) => [file, await dataSource.query(sql, [userId])] as const,
  );
  return Object.fromEntries(await Promise.all(files));
}
