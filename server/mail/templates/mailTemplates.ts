import { confirmMail, emailChangeMail, erasureMail, knownAddressMail, resetMail, securityMail } from "./accountMails";
import {
  answeredMail,
  assignedMail,
  guardianKeptMail,
  guardianMail,
  handedInMail,
  inviteMail,
  weeklyMail,
} from "./studioMails";

/** Every kind of mail that Larkspan sends: from its data and the link it leads to. */
export const mailTemplates = {
  confirm: confirmMail,
  knownAddress: knownAddressMail,
  reset: resetMail,
  emailChange: emailChangeMail,
  security: securityMail,
  erasure: erasureMail,
  invite: inviteMail,
  guardian: guardianMail,
  guardianKept: guardianKeptMail,
  assigned: assignedMail,
  handedIn: handedInMail,
  answered: answeredMail,
  weekly: weeklyMail,
};

export type MailKind = keyof typeof mailTemplates;
export type MailData<Kind extends MailKind> = Parameters<(typeof mailTemplates)[Kind]>[0];
