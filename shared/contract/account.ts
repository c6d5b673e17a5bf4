import { z } from "zod";

const email = z.email("Write an e-mail address, like name@example.org.").max(254);

/** Request to open an account. Passwords: 12 to 128 characters, no composition rules. */
export const signUpRequest = z.strictObject({
  email,
  password: z.string().min(12, "Use at least 12 characters.").max(128, "Use at most 128 characters."),
});
export type SignUpRequest = z.infer<typeof signUpRequest>;

/** Request to sign in. */
export const signInRequest = z.strictObject({ email, password: z.string().min(1, "Type your password.").max(128) });
export type SignInRequest = z.infer<typeof signInRequest>;

/** The signed-in person. */
export const account = z.strictObject({
  id: z.uuid(),
  email: z.string(),
  role: z.enum(["singer", "teacher", "admin"]),
});
export type Account = z.infer<typeof account>;

/** Answer to sign-up, sign-in and refresh: the short access token; the refresh token travels in a cookie. */
export const sessionResponse = z.strictObject({ accessToken: z.string(), expiresInS: z.int(), account });
export type SessionResponse = z.infer<typeof sessionResponse>;
