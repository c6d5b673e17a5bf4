import { HttpProblem } from "../http/httpProblem";
import { isCommonPassword } from "./commonPasswords";

const plain = (text: string) => text.normalize("NFKC").toLowerCase();

/** Refuses passwords that are tried first by those who guess: from lists, made of one's own address, or of one thing again and again. */
export function refuseCommonPassword(password: string, email: string, field = "password"): void {
  const words = plain(password);
  const [name = ""] = plain(email).split("@");
  const own = [plain(email), "larkspan", ...(name.length >= 4 ? [name] : [])];
  const rest = own.reduce((left, word) => left.replaceAll(word, ""), words);
  const isRepeated = /^(.{1,4})\1+.{0,3}$/su.test(words);
  if (isCommonPassword(words) || rest.length < 6 || isRepeated) {
    const message =
      "This password is easy to guess: it is on lists of common ones, or made of your address. Choose another.";
    throw new HttpProblem(422, "invalid", message, [{ path: field, message }]);
  }
}
