/** How an address names a species, "corundum", or one form of it, "corundum.ruby". */
export type SpeciesRef = Readonly<{ speciesId: string; formId: string | null }>;

export const mostCompared = 4;

/** @returns undefined when the text has not the shape of a reference; whether the species is there is the table's to say */
export function parseSpeciesRef(text: string): SpeciesRef | undefined {
  const [, speciesId, formId = null] = /^([a-z0-9-]{1,60})(?:\.([a-z0-9-]{1,60}))?$/.exec(text) ?? [];
  return speciesId ? { speciesId, formId } : undefined;
}

export const formatSpeciesRef = ({ speciesId, formId }: SpeciesRef) => (formId ? `${speciesId}.${formId}` : speciesId);
