/** A mail without its addresses. */
export interface Mail {
  subject: string;
  text: string;
  html: string;
}

/** What a mail says, before it is set in text and HTML. */
interface MailWords {
  subject: string;
  /** paragraphs */
  says: string[];
  action?: { label: string; link: string };
  /** a quotation of what a person wrote */
  quote?: string | null;
  /** in small print at the end: why it came, what to do if it was not you */
  foot: string[];
}

const style = `
:root{color-scheme:light dark;supported-color-schemes:light dark}
body{margin:0;padding:24px 12px;background:#FBF6EC;color:#241C33;font:16px/1.5 system-ui,-apple-system,"Segoe UI",sans-serif}
.card{max-width:520px;margin:0 auto;padding:24px;background:#FFFFFF;border:1px solid #E3DACB;border-radius:14px}
h1{margin:0 0 12px;font-size:22px;line-height:1.2}
p{margin:0 0 12px;overflow-wrap:anywhere}
blockquote{margin:0 0 12px;padding:0 0 0 12px;border-left:3px solid #6A2C70;white-space:pre-wrap;overflow-wrap:anywhere}
.go{display:inline-block;margin:4px 0 12px;padding:14px 20px;background:#6A2C70;color:#FFFFFF;border-radius:10px;font-weight:600;text-decoration:none}
.link{font-size:14px;color:#5D5370}
.link a{color:#6A2C70}
.foot{max-width:520px;margin:16px auto 0;padding:0 24px;font-size:14px;color:#5D5370}
.foot a{color:#6A2C70}
@media(prefers-color-scheme:dark){
body{background:#17131F;color:#F3ECDF}.card{background:#221C2D;border-color:#3A3148}blockquote{border-color:#D79AE0}
.go{background:#D79AE0;color:#17131F}.link,.foot{color:#B9AEC9}.link a,.foot a{color:#D79AE0}}
`;

/** Sets a mail in both forms: the same words, no pictures, nothing fetched from anywhere. */
export function setMail({ subject, says, action, quote, foot }: MailWords): Mail {
  const text = [
    ...says,
    ...(quote ? [quote.replace(/^/gm, "> ")] : []),
    ...(action ? [`${action.label}:\n${action.link}`] : []),
    `--\n${["Larkspan", ...foot].join("\n")}`,
  ].join("\n\n");
  const link = action && escapeHtml(action.link);
  const html = `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark"><title>${escapeHtml(subject)}</title><style>${style}</style></head>
<body><div class="card"><h1>${escapeHtml(subject)}</h1>
${says.map((words) => `<p>${escapeHtml(words)}</p>`).join("\n")}
${quote ? `<blockquote>${escapeHtml(quote)}</blockquote>` : ""}
${action ? `<p><a class="go" href="${link}">${escapeHtml(action.label)}</a></p><p class="link">If the button does nothing, open this address:<br><a href="${link}">${link}</a></p>` : ""}
</div><div class="foot">${foot.map((words) => `<p>${linked(words)}</p>`).join("\n")}<p>Larkspan</p></div></body></html>
`;
  // A line break in a title must not become a header of its own.
  return { subject: subject.replace(/\s+/g, " "), text: `${text}\n`, html };
}

/** Text as HTML; what people wrote never becomes markup. */
export function escapeHtml(text: string): string {
  const entities: Record<string, string> = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;", "'": "&#39;" };
  return text.replace(/[&<>"']/g, (sign) => entities[sign] ?? sign);
}

/** Our own foot lines may end in an address. */
const linked = (words: string) =>
  escapeHtml(words).replace(/https?:\/\/[^\s<>"]+$/, (address) => `<a href="${address}">${address}</a>`);
