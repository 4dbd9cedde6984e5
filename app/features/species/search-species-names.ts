import Fuse from "fuse.js/min-basic";
import type { FoundSpecies, NameKind, SpeciesName, SpeciesNames } from "./species-names.ts";

/** Which name a species is found by where several fit equally well. */
const kindOrder: Readonly<Record<NameKind, number>> = { species: 0, form: 1, trade: 2, misleading: 3, family: 4 };

export type SpeciesSearch = (words: string, limit?: number) => FoundSpecies[];

/**
 * Finds species by any of their names, forgiving slips of the keys; the same in the browser and on the server.
 * A misleading name finds what it is used for, not what it pretends to be.
 */
export function createSpeciesSearch({ species, names }: SpeciesNames): SpeciesSearch {
  const folded = names.map(({ name }) => foldName(name));
  const fuse = new Fuse(folded, { includeScore: true, threshold: 0.32, ignoreLocation: true, minMatchCharLength: 2 });
  return (words, limit = Infinity) => {
    const wanted = foldName(words).slice(0, 32); // the longest a search of letters can be
    if (wanted === "") return [];
    const held = folded.flatMap((name, at) => (name.includes(wanted) ? [{ by: names[at]!, nearness: nearness(name, wanted), score: name.length }] : []));
    // Only where no name holds the words as they were typed is it guessed what was meant.
    const hits = held.length > 0 ? held : fuse.search(wanted).map(({ refIndex, score = 1 }) => ({ by: names[refIndex]!, nearness: 4, score }));
    const best = new Map<string, FoundSpecies>();
    for (const { by } of hits.sort(compareHits)) {
      if (!best.has(by.speciesId)) best.set(by.speciesId, { speciesId: by.speciesId, speciesName: species[by.speciesId] ?? by.speciesId, by });
      if (best.size >= limit) break;
    }
    return [...best.values()];
  };
}

/** Of a name that holds the words: 0 is them, 1 begins with them, 2 has a word that does, 3 holds them within. */
function nearness(name: string, wanted: string): number {
  if (name === wanted) return 0;
  if (name.startsWith(wanted)) return 1;
  return name.includes(` ${wanted}`) ? 2 : 3;
}

type Hit = { by: SpeciesName; nearness: number; score: number };

function compareHits(one: Hit, other: Hit): number {
  return one.nearness - other.nearness || (one.nearness === 4 ? one.score - other.score : 0) || kindOrder[one.by.kind] - kindOrder[other.by.kind] || one.score - other.score || one.by.name.localeCompare(other.by.name, "en");
}

/** Small letters without accents, one kind of apostrophe, hyphens as spaces: what people leave out. */
export function foldName(name: string): string {
  return name.normalize("NFD").replace(/\p{M}/gu, "").toLowerCase().replace(/[’'`´]/g, "").replace(/[^\p{L}\p{N}]+/gu, " ").trim();
}
