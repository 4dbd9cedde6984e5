/** What is known about how people choose: a word list and the rows of a keyboard. */
export type CommonPieces = Readonly<{
  /** Lower case; words and whole phrases without spaces. */
  words: ReadonlySet<string>;
  /** About the person and the place: names, the parts of the e-mail address. Lower case. */
  ownWords: readonly string[];
}>;

const rows = ["qwertyuiop", "asdfghjkl", "zxcvbnm", "qwertzuiop", "azertyuiop", "yxcvbnm", "1234567890", "qwertyuiopasdfghjklzxcvbnm", "abcdefghijklmnopqrstuvwxyz", "1q2w3e4r5t6y7u8i9o0p", "qazwsxedcrfvtgbyhnujmikolp", "1qaz2wsx3edc4rfv5tgb6yhn7ujm8ik9ol0p", "zaq1xsw2cde3vfr4bgt5nhy6mju7", "0123456789", "!@#$%^&*()"];
const walks = rows.flatMap((row) => [row + row, [...row + row].reverse().join("")]);
const looksLike: Readonly<Record<string, string>> = { "0": "o", "1": "i", "3": "e", "4": "a", "5": "s", "7": "t", "8": "b", "@": "a", "$": "s", "!": "i", "€": "e", "£": "l", "|": "l" };

/** Costs in powers of ten: how many tries it takes somebody who knows the pieces. Common practice, calibrated by our own examples. */
const cost = { ownWord: 0.5, word: 2.9, walk: 2, sameSign: 1.5, year: 1.8, again: 0.8, gaps: 0.3, digit: 1, letter: 1.4, other: 1.6, disguise: 0.6 };
const longestPiece = 40;

/**
 * How many tries, as a power of ten, the cheapest way takes to build a password from common pieces: words, keyboard
 * walks, runs of one sign, years, repeats. Says nothing about a password made of anything else than that it is long.
 */
export function passwordTriesLog10(password: string, { words, ownWords }: CommonPieces): number {
  const own = new Set(ownWords);
  const typed = password.toLowerCase();
  const joined = typed.replace(/[\s._,-]/g, "");
  const asTyped = cheapest(typed, { words, own });
  return joined === typed ? asTyped : Math.min(asTyped, cheapest(joined, { words, own }) + cost.gaps);
}

type Known = { words: ReadonlySet<string>; own: ReadonlySet<string> };

function cheapest(text: string, known: Known): number {
  const best = [0];
  for (let end = 1; end <= text.length; end++) {
    best[end] = best[end - 1]! + costOfSign(text[end - 1]!);
    for (let start = Math.max(0, end - longestPiece); start <= end - 3; start++) {
      const piece = text.slice(start, end);
      const isAgain = text.slice(Math.max(0, start - piece.length), start) === piece;
      const price = isAgain ? cost.again : costOfPiece(piece, known);
      if (price !== undefined) best[end] = Math.min(best[end]!, best[start]! + price);
    }
  }
  return best[text.length]!;
}

function costOfSign(sign: string): number {
  if (/[0-9]/.test(sign)) return cost.digit;
  return /[a-z]/.test(sign) ? cost.letter : cost.other;
}

function costOfPiece(piece: string, { words, own }: Known): number | undefined {
  if (own.has(piece)) return cost.ownWord;
  if (words.has(piece)) return cost.word;
  if (/^(19|20)\d\d$/.test(piece)) return cost.year;
  if ([...piece].every((sign) => sign === piece[0])) return cost.sameSign;
  if (piece.length >= 4 && walks.some((walk) => walk.includes(piece))) return cost.walk;
  const undisguised = [...piece].map((sign) => looksLike[sign] ?? sign).join("");
  if (undisguised === piece) return undefined;
  if (own.has(undisguised)) return cost.ownWord + cost.disguise;
  return words.has(undisguised) ? cost.word + cost.disguise : undefined;
}
