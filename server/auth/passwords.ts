import { argon2id, hash, verify } from "argon2";

/** OWASP's Password Storage Cheat Sheet: argon2id with 19 MiB, two passes, one lane. */
const cost = { type: argon2id, memoryCost: 19 * 1024, timeCost: 2, parallelism: 1 };

/** The same password typed on different systems may arrive in different Unicode forms (RFC 8265). */
const canonical = (password: string) => password.normalize("NFKC");

export function hashPassword(password: string): Promise<string> {
  return hash(canonical(password), cost);
}

export async function passwordMatches(storedHash: string | null, password: string): Promise<boolean> {
  // An unknown address must take as long as a wrong password, or the time would tell who has an account.
  const matches = await verify(storedHash ?? (await unknownAddress()), canonical(password));
  return matches && storedHash !== null;
}

let placeholder: Promise<string> | undefined;

function unknownAddress(): Promise<string> {
  placeholder ??= hashPassword("no account has this password");
  return placeholder;
}

/** Makes the placeholder before the first request needs it. */
export async function preparePasswords(): Promise<void> {
  await unknownAddress();
}
