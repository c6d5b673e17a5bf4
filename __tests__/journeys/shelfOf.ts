import type { Page } from "playwright-core";

/** Puts a new thing of one kind, such as "songs", onto a shelf as its owner's pages do. */
export type Put = (kind: string, item: { id: string } & Record<string, unknown>) => Promise<void>;

/** The shelf of an account that signs up, or in, without its pages. */
export async function shelfOf(page: Page, email: string, password: string, enter: "sign-up" | "sign-in"): Promise<Put> {
  const entered = await page.request.post(`/api/auth/${enter}`, { data: { email, password } });
  const { accessToken } = (await entered.json()) as { accessToken: string };
  return async (kind, item) => {
    const answer = await page.request.put(`/api/${kind}/${item.id}`, {
      data: item,
      headers: { Authorization: `Bearer ${accessToken}` },
    });
    expect([answer.status(), await answer.text()]).toEqual([201, expect.anything()]);
  };
}
