import { type Mail, setMail } from "./mailLayout";

const notYou = "If this was not you, do nothing: without the link nothing happens.";

/** To a new address: is it yours? */
export function confirmMail(_data: object, link: string): Mail {
  return setMail({
    subject: "Is this your address?",
    says: [
      "You opened an account at Larkspan with this e-mail address. Confirm that it is yours, so that you can get back in if you forget your password, and join a studio.",
      "The link is good for three days.",
    ],
    action: { label: "Confirm this address", link },
    foot: [notYou],
  });
}

/** To the owner of an account whose address was typed at sign-up, with another password. */
export function knownAddressMail(_data: object, link: string): Mail {
  return setMail({
    subject: "You have an account already",
    says: [
      "Somebody, perhaps you, signed up at Larkspan with this e-mail address. It belongs to your account already; that account was not touched.",
      "If it was you: sign in with the password of your account, or choose a new one if you forgot it. What you just did is kept under the password you typed, apart from your account.",
    ],
    action: { label: "Choose a new password", link },
    foot: ["If it was not you, do nothing: nobody got into your account."],
  });
}

/** The way back in for whoever forgot the password. */
export function resetMail(_data: object, link: string): Mail {
  return setMail({
    subject: "Choose a new password",
    says: [
      "You asked for a new password at Larkspan. The link is good once, for one hour. It ends all your sessions everywhere.",
    ],
    action: { label: "Choose a new password", link },
    foot: [notYou],
  });
}

/** To the address that is to be the account's. */
export function emailChangeMail(_data: object, link: string): Mail {
  return setMail({
    subject: "Use this address from now on?",
    says: [
      "You want to use this e-mail address for your account at Larkspan. Confirm that it is yours; until then the old one stays.",
      "The link is good for one day.",
    ],
    action: { label: "Use this address", link },
    foot: [notYou],
  });
}

export type SecurityEvent = keyof typeof securityWords;

const securityWords = {
  "email-changing": {
    subject: "Your e-mail address is about to change",
    says: "Somebody who knows your password asked to use another e-mail address for your account at Larkspan. The change takes effect when the new address is confirmed.",
  },
  "email-changed": {
    subject: "Your e-mail address was changed",
    says: "Your account at Larkspan has another e-mail address now. This one no longer belongs to it.",
  },
  "password-changed": {
    subject: "Your password was changed",
    says: "The password of your account at Larkspan was changed, and other sessions were ended.",
  },
  "second-factor-on": {
    subject: "Signing in takes a code now",
    says: "Your account at Larkspan asks for a code from your authenticator app from now on. Keep the recovery codes in a safe place.",
  },
  "second-factor-off": {
    subject: "Signing in takes no code any more",
    says: "Your account at Larkspan no longer asks for a code from an authenticator app.",
  },
  "recovery-code-used": {
    subject: "A recovery code was used",
    says: "Somebody signed in to your account at Larkspan with one of your recovery codes.",
  },
  "recovery-codes-new": {
    subject: "You have new recovery codes",
    says: "New recovery codes were made for your account at Larkspan. The old ones are worth nothing now.",
  },
  "role-changed": {
    subject: "Your role was changed",
    says: "An administrator changed your role at Larkspan. Sign in to see what you can do now.",
  },
} as const;

/** Something about the account's safety has changed; goes to its owner without asking. */
export function securityMail({ what }: { what: SecurityEvent }, link: string): Mail {
  const { subject, says } = securityWords[what];
  return setMail({
    subject,
    says: [says],
    action: { label: "Look at your account", link },
    foot: ["If this was not you, choose a new password at once: it ends every session."],
  });
}

/** The account will be erased unless its owner comes back. */
export function erasureMail({ onDay }: { onDay: string }, link: string): Mail {
  return setMail({
    subject: "Your account will be erased",
    says: [
      `You asked for your account at Larkspan to be erased. On ${onDay} it goes, with everything in it, for good.`,
      "If you change your mind, sign in before that day: signing in keeps the account.",
    ],
    action: { label: "Sign in and keep it", link },
    foot: ["If this was not you, sign in and choose a new password."],
  });
}
