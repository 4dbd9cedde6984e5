import { openOutbox } from "./outbox-store.ts";

/** So long a stone's page is shown without the line; the service worker's copies live as long. */
export const keptForMs = 12 * 60 * 60 * 1000;
const keyOf = (labSlug: string, stoneCode: string) => `${labSlug}/${stoneCode}`;

/** Keeps what a stone's page shows; private mode and full devices keep nothing, and the page works as before. */
export async function keepPage({ labSlug, stoneCode, person, loaderData }: { labSlug: string; stoneCode: string; person: string; loaderData: unknown }): Promise<void> {
  try {
    await (await openOutbox()).put("pages", { person, keptAt: Date.now(), loaderData }, keyOf(labSlug, stoneCode));
  } catch {
    // Without the store there is no offline page, and nothing else is missing.
  }
}

export async function keptPage<Data>(labSlug: string, stoneCode: string): Promise<Data | null> {
  try {
    const kept = await (await openOutbox()).get("pages", keyOf(labSlug, stoneCode));
    return kept && Date.now() - kept.keptAt < keptForMs ? (kept.loaderData as Data) : null;
  } catch {
    return null;
  }
}
