import { randomUUID } from "node:crypto";
import type { Page } from "playwright-core";

/** Keeps a song whose melody has so many notes for the person signed in; returns its id. */
export async function longSong(page: Page, count: number): Promise<string> {
  const song = {
    id: randomUUID(),
    title: "Long Way About",
    chart: "D  G  A\nround the harbour and back",
    writtenKey: { tonic: "D", mode: "major" },
    tune: {
      kind: "melody",
      home: "D",
      notes: Array.from({ length: count }, (_, index) => ({
        midi: 60 + ((index * 7 + Math.floor(index / 12)) % 15),
        start: index,
        duration: 0.5 + (index % 4) / 4,
      })),
    },
    beatsPerBar: 4,
    tempo: 92,
    demo: null,
    tags: [],
    archivedAt: null,
    playedAt: null,
    createdAt: new Date().toISOString(),
    revision: 0,
  };
  const status = await page.evaluate(async (body) => {
    const { accessToken } = (await (await fetch("/api/auth/refresh", { method: "POST" })).json()) as {
      accessToken: string;
    };
    const answer = await fetch(`/api/songs/${body.id}`, {
      method: "PUT",
      headers: { authorization: `Bearer ${accessToken}`, "content-type": "application/json" },
      body: JSON.stringify(body),
    });
    return answer.status;
  }, song);
  if (status !== 201) throw new Error(`The song was answered with ${status}.`);
  return song.id;
}
