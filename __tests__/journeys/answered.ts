import type { Page } from "playwright-core";

/** What the server answers at this address of its interface to whoever is signed in on the page. */
export function answered<T>(page: Page, path: string): Promise<T> {
  return page.evaluate(
    `fetch('/api/auth/refresh', { method: 'POST' }).then((r) => r.json()).then(({ accessToken }) => fetch('/api${path}', { headers: { authorization: 'Bearer ' + accessToken } })).then((r) => r.json())`,
  );
}
