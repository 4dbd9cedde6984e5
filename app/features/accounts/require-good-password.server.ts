import { AppError } from "#app/domain/app-error.ts";
import { passwordTriesLog10 } from "#app/domain/password-tries.ts";
import { commonWords } from "./common-pieces.server.ts";
import { longestPassword, shortestPassword } from "./password-length.ts";

const fewestTriesLog10 = 8;

type About = { password: string; name: string; email: string; laboratoryName?: string };

/**
 * Refuses a new password that is too short, too long, or among the first a guesser would try. No rules about kinds of
 * characters (NIST SP 800-63B, 5.1.1.2).
 * @throws AppError invalid_input with the message beside the field "password"
 */
export function requireGoodPassword({ password, name, email, laboratoryName = "" }: About): void {
  const length = [...password].length;
  if (length < shortestPassword) refuse(`The password has ${length} characters; it needs at least ${shortestPassword}. A few words that do not belong together are easy to remember.`);
  if (length > longestPassword) refuse(`The password has ${length} characters; at most ${longestPassword} are kept.`);
  const ownWords = ownWordsOf([name, email, laboratoryName]);
  if (passwordTriesLog10(password, { words: commonWords(), ownWords }) < fewestTriesLog10) {
    refuse("This password is among the first that a guesser would try: common words, names, dates, keyboard rows or repeats. Add a word or two that nobody would expect.");
  }
}

function ownWordsOf(texts: readonly string[]): string[] {
  return texts.flatMap((text) => {
    const lower = text.toLowerCase();
    const parts = lower.split(/[^\p{L}\p{N}]+/u).filter((part) => part.length >= 3);
    return [...parts, lower, parts.join("")].filter((part) => part.length >= 3);
  });
}

function refuse(message: string): never {
  throw new AppError("invalid_input", message, { fieldErrors: { password: [message] } });
}
