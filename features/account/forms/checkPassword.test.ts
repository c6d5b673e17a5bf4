import { signInRequest, signUpRequest } from "@/shared/contract/account";
import { checkKnownPassword, checkNewPassword } from "./checkPassword";

const email = "maren@orlow.example";

it.each(["", "eleven char", "twelve chars", "x".repeat(128), "x".repeat(129)])(
  "says of %j what the contract says",
  (password) => {
    expect(checkNewPassword(password)).toBe(
      signUpRequest.safeParse({ email, password }).error?.issues[0]?.message ?? null,
    );
  },
);

it("asks for a password in the contract's words", () => {
  expect(checkKnownPassword("")).toBe(signInRequest.safeParse({ email, password: "" }).error?.issues[0]?.message);
  expect(checkKnownPassword("x")).toBeNull();
});
