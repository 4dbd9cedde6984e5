/** Tokens longer than this are cut, in the index and in the query alike. */
const longestToken = 12;
const shortestToken = 2;
const widestColumn = 40;

/**
 * What is stored for a stone: every beginning, from two characters on, of every word in its texts, so that a search
 * for the beginning of a word is one exact range of the index in the order of the logbook. A compound (a code, a
 * double-barrelled word) is stored joined from each of its parts on: "MQ-26-0417" is found by "mq26", "26-0417" and "0417".
 */
export function indexTokens(texts: readonly string[]): string[] {
  const tokens = new Set<string>();
  for (const text of texts) {
    for (const chunk of fold(text).split(/[\s·,;/]+/u)) {
      const parts = chunk.split(/[^\p{L}\p{N}]+/u).filter(Boolean);
      const words = [...parts, ...parts.map((_, at) => parts.slice(at).join(""))];
      for (const word of [...words, ...words.map((part) => part.replace(/^0+(?=\d)/, ""))]) {
        const units = encode(word);
        for (let length = shortestToken; length <= units.length; length++) tokens.add(units.slice(0, length).join(""));
      }
    }
  }
  return [...tokens];
}

/** The tokens that a typed search asks for, longest (so, as a rule, rarest) first; none where nothing can be searched. */
export function queryTokens(query: string): string[] {
  const tokens = new Set<string>();
  for (const chunk of fold(query).split(/[\s·,;/]+/u)) {
    const units = encode(chunk.replace(/[^\p{L}\p{N}]+/gu, ""));
    if (units.length >= shortestToken) tokens.add(units.join(""));
  }
  return [...tokens].sort((a, b) => b.length - a.length || (a < b ? -1 : 1)).slice(0, 5);
}

function fold(text: string): string {
  return text.normalize("NFKD").replace(/\p{M}/gu, "").toLowerCase().replaceAll("ß", "ss").replaceAll("ø", "o").replaceAll("ł", "l").replaceAll("æ", "ae");
}

// The index compares bytes of ASCII: letters of other scripts go in by their number, one unit each, so beginnings stay beginnings.
function encode(word: string): string[] {
  const units: string[] = [];
  let bytes = 0;
  for (const character of word) {
    const unit = /[a-z0-9]/.test(character) ? character : `~${character.codePointAt(0)!.toString(36)}`;
    bytes += unit.length;
    if (units.length === longestToken || bytes > widestColumn) break;
    units.push(unit);
  }
  return units;
}
