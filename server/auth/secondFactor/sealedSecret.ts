import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from "node:crypto";

const keyOf = (secret: string) => Buffer.from(hkdfSync("sha256", secret, "", "larkspan second factor", 32));

/** Encrypts (AES-256-GCM) what the database should not know in the clear: nonce, tag, then the text. */
export function seal(secret: string, plain: Uint8Array): Buffer {
  const nonce = randomBytes(12);
  const cipher = createCipheriv("aes-256-gcm", keyOf(secret), nonce);
  const text = Buffer.concat([cipher.update(plain), cipher.final()]);
  return Buffer.concat([nonce, cipher.getAuthTag(), text]);
}

/** @throws Error where it was sealed by another secret, or changed */
export function unseal(secret: string, sealed: Buffer): Buffer {
  const decipher = createDecipheriv("aes-256-gcm", keyOf(secret), sealed.subarray(0, 12));
  decipher.setAuthTag(sealed.subarray(12, 28));
  return Buffer.concat([decipher.update(sealed.subarray(28)), decipher.final()]);
}
