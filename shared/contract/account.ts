import { z } from "zod";

export const email = z.email("Write an e-mail address, like name@example.org.").max(254);
const newPassword = z.string().min(12, "Use at least 12 characters.").max(128, "Use at most 128 characters.");
const password = z.string().min(1, "Type your password.").max(128);
const linkToken = z.string().min(1).max(200);
const code = z.string().trim().min(6, "Type the six digits, or a recovery code.").max(20);

/** Request to open an account. Passwords: 12 to 128 characters, no composition rules. */
export const signUpRequest = z.strictObject({ email, password: newPassword });
export type SignUpRequest = z.infer<typeof signUpRequest>;

/** Request to sign in. */
export const signInRequest = z.strictObject({ email, password });
export type SignInRequest = z.infer<typeof signInRequest>;

export const role = z.enum(["singer", "teacher", "admin"]);
export type Role = z.infer<typeof role>;

/** The signed-in person. */
export const account = z.strictObject({
  id: z.uuid(),
  email: z.string(),
  role,
  /** the owner has shown that the e-mail address is theirs */
  confirmed: z.boolean(),
  /** signing in takes a code as well */
  secondFactor: z.boolean(),
});
export type Account = z.infer<typeof account>;

/** Answer to sign-up, sign-in and refresh: the short access token; the refresh token travels in a cookie. */
export const sessionResponse = z.strictObject({ accessToken: z.string(), expiresInS: z.int(), account });
export type SessionResponse = z.infer<typeof sessionResponse>;

/** Answer (202) to a right password where a code is needed as well: hand it in with the code. */
export const challengeResponse = z.strictObject({ challenge: z.string(), expiresInS: z.int() });
export type ChallengeResponse = z.infer<typeof challengeResponse>;

/** The second step of signing in; the code is of the authenticator app or a recovery code. */
export const secondStepRequest = z.strictObject({ challenge: z.string().min(1).max(1000), code });

/** Request for a link to choose a new password. */
export const forgottenRequest = z.strictObject({ email });

/** A new password, by the link from the mail. */
export const resetRequest = z.strictObject({ token: linkToken, password: newPassword });

/** The link from a mail that asks whether an address is yours. */
export const confirmEmailRequest = z.strictObject({ token: linkToken });

/** Another address for the account. */
export const changeEmailRequest = z.strictObject({ email, password });

/** Another password for the account. */
export const changePasswordRequest = z.strictObject({ present: password, next: newPassword });

/** The password once more, before something that matters. */
export const passwordRequest = z.strictObject({ password });

/** A place where one is signed in. */
export const openSession = z.strictObject({
  id: z.uuid(),
  /** such as "Firefox on Linux" */
  device: z.string(),
  begunAt: z.iso.datetime(),
  lastUsedAt: z.iso.datetime(),
  /** the session that asks */
  current: z.boolean(),
});
export type OpenSession = z.infer<typeof openSession>;

/** What may be asked when ending all sessions: whether the one that asks goes on. */
export const endSessionsQuery = z.strictObject({ keepThis: z.enum(["true", "false"]).optional() });

/** Whether signing in takes a code. */
export const secondFactor = z.strictObject({ on: z.boolean(), recoveryCodesLeft: z.int().min(0) });
export type SecondFactor = z.infer<typeof secondFactor>;

/** What an authenticator app needs: as a picture (an SVG document), as an address, and to type. Shown once. */
export const secondFactorSetup = z.strictObject({ qrSvg: z.string(), uri: z.string(), secret: z.string() });
export type SecondFactorSetup = z.infer<typeof secondFactorSetup>;

/** A code of the authenticator app. */
export const codeRequest = z.strictObject({ code });

/** Password and code together. */
export const passwordAndCodeRequest = z.strictObject({ password, code });

/** Codes that stand in for the app, each good once. Shown once. */
export const recoveryCodes = z.strictObject({ recoveryCodes: z.array(z.string()) });
export type RecoveryCodes = z.infer<typeof recoveryCodes>;

/** When an account that was asked to be erased will be gone; signing in before keeps it. */
export const erasure = z.strictObject({ eraseAt: z.iso.datetime() });
export type Erasure = z.infer<typeof erasure>;

/** What is asked neutrally, of everybody: decides whether a guardian must agree. Null until told. */
export const personFacts = z.strictObject({
  birthYear: z.int().min(1900, "Give the year in four digits.").max(2100).nullable(),
  /** ISO 3166-1, two capital letters */
  country: z
    .string()
    .regex(/^[A-Z]{2}$/, "Choose a country.")
    .nullable(),
});
export type PersonFacts = z.infer<typeof personFacts>;

/** The same as it is told. */
export const personFactsChange = personFacts.extend({
  /** agrees that sharing with teachers ends by it, and recordings handed in are deleted */
  endsSharing: z.boolean().exactOptional(),
});
export type PersonFactsChange = z.infer<typeof personFactsChange>;
