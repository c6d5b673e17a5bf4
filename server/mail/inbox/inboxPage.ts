import type { RequestHandler } from "express";
import { escapeHtml } from "../templates/mailLayout";
import type { ArrivedMail, FakeSmtp } from "./fakeSmtp";

const style = `
:root{color-scheme:light dark}
body{margin:0 auto;max-width:760px;padding:24px 16px;font:16px/1.5 system-ui,sans-serif}
h1{font-size:26px;line-height:1.2}li{margin:8px 0}a{overflow-wrap:anywhere}
pre{white-space:pre-wrap;overflow-wrap:anywhere;font:inherit;border:1px solid;border-radius:10px;padding:12px}
dt{font-weight:600}dd{margin:0 0 8px}
`;

/** The mails that nobody was sent, to read while developing: a list, each as text, each as HTML, and all as JSON. */
export function inboxPage(smtp: FakeSmtp): RequestHandler {
  return (req, res, next) => {
    if (req.method !== "GET" && req.method !== "HEAD") {
      next();
      return;
    }
    res.set("Cache-Control", "no-store").set("X-Robots-Tag", "noindex");
    if (req.path === "/") {
      res.type("html").send(page("Inbox", list(smtp.mails)));
      return;
    }
    if (req.path === "/mails.json") {
      res.json(smtp.mails);
      return;
    }
    const [, number, form] = /^\/(\d{1,9})(\/html)?\/?$/.exec(req.path) ?? [];
    const mail = number === undefined ? undefined : smtp.mails.at(-Number(number));
    if (!mail || number === "0") {
      res.status(404).type("html").send(page("No such mail", `<p><a href="/dev/inbox">Inbox</a></p>`));
    } else if (form) {
      res.set("Content-Security-Policy", "default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'none'");
      res.type("html").send(mail.html);
    } else {
      res.type("html").send(page(mail.subject, one(mail, number ?? "")));
    }
  };
}

function list(mails: readonly ArrivedMail[]): string {
  if (mails.length === 0) return "<p>No mail was sent yet since the server started.</p>";
  const items = mails.map(
    (mail, k) =>
      `<li><a href="/dev/inbox/${mails.length - k}">${escapeHtml(mail.subject)}</a><br>to ${escapeHtml(mail.to)}, ${mail.at.toISOString()}</li>`,
  );
  return `<p>Nothing is really sent while developing. Newest first.</p><ol reversed>${items.join("")}</ol>`;
}

function one(mail: ArrivedMail, number: string): string {
  const linked = escapeHtml(mail.text).replace(/https?:\/\/[^\s<&]+/g, (link) => `<a href="${link}">${link}</a>`);
  const headers = Object.entries(mail.headers).map(
    ([name, value]) => `<dt>${escapeHtml(name)}</dt><dd>${escapeHtml(value)}</dd>`,
  );
  return `<p><a href="/dev/inbox">Inbox</a> · <a href="/dev/inbox/${number}/html">As HTML</a></p>
<pre>${linked}</pre><details><summary>Headers</summary><dl>${headers.join("")}</dl></details>`;
}

const page = (title: string, body: string) => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escapeHtml(title)}</title><style>${style}</style></head><body><h1>${escapeHtml(title)}</h1>${body}</body></html>
`;
