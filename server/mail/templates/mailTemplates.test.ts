import { type MailKind, mailTemplates } from "./mailTemplates";
import type { Mail } from "./mailLayout";

const hostile = `<img src=x onerror="alert(1)">\r\nBcc: everybody@orlow-quay.example`;
const link = "https://larkspan.example/account/reset#abc-DEF_1";

const data: { [Kind in MailKind]: Parameters<(typeof mailTemplates)[Kind]>[0] } = {
  confirm: {},
  knownAddress: {},
  reset: {},
  emailChange: {},
  security: { what: "password-changed" },
  erasure: { onDay: "15 December 2026" },
  invite: { teacher: hostile, studio: hostile },
  guardian: { pupil: hostile, studio: hostile, teacher: hostile },
  guardianKept: { pupil: hostile, studio: hostile },
  assigned: { studio: hostile, song: hostile, key: "B♭ major", due: "12 December", note: hostile },
  handedIn: { pupil: hostile, song: hostile, note: hostile },
  answered: { teacher: hostile, song: hostile, accepted: false, note: hostile },
  weekly: { lines: [hostile] },
};

describe.each(Object.keys(mailTemplates) as MailKind[])("the mail %s", (kind) => {
  const mail = (mailTemplates[kind] as (data: object, link: string) => Mail)(data[kind], link);

  it("says the same in text and HTML and leads to its link in both", () => {
    expect(mail.text).toContain(link);
    expect(mail.html).toContain(`href="${link}"`);
    expect(mail.subject).toMatch(/\S/);
    expect(mail.text.endsWith("\n")).toBe(true);
  });

  it("fetches nothing, runs nothing, and never takes what people wrote for markup or a header", () => {
    expect(mail.html).not.toMatch(/<img|<script|<iframe|<link|url\(|@import|src=["']?http/i);
    expect(mail.subject).not.toMatch(/[\r\n]/);
  });

  it("is readable on light and on dark", () => {
    expect(mail.html).toContain('<meta name="color-scheme" content="light dark">');
    expect(mail.html).toContain("prefers-color-scheme:dark");
  });
});
