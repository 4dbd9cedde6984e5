import { readFileSync } from "node:fs";
import { inArray } from "drizzle-orm";
import { openDb } from "#app/db/client.server.ts";
import { laboratories } from "#app/db/schema/index.ts";
import { renderInProcess } from "#app/features/reports/render-in-process.server.ts";
import type { Services } from "#app/features/services.ts";
import { createPasswords } from "#app/integrations/passwords.server.ts";
import { createStripe } from "#app/integrations/stripe.server.ts";
import { createUploads } from "#app/integrations/uploads.server.ts";
import { addPeople, checkInstrumentsAgain, openDemoLaboratory, type Person } from "./demo/open-laboratories.ts";
import { saveDemoParcel } from "./demo/save-parcel.ts";
import { marramStories, tarnStories } from "./demo/stories.ts";
import { tellStory } from "./demo/tell-story.ts";

/** Loads the demonstration laboratories by the product's own operations; does nothing when they are there. */
const { db, close } = openDb(process.env.DATABASE_URL ?? "");
const there = (await db.select({ slug: laboratories.slug }).from(laboratories).where(inArray(laboratories.slug, ["marram-quay", "tarn-and-vale"]))).map(({ slug }) => slug);
if (there.length === 1) console.error("The demonstration was loaded only in part, by a start that was interrupted. Remove the folder .data (or empty the database) and start again, or start with ISOGYRE_DEMO=0.");
if (there.length === 0) await load();
await close();

async function load(): Promise<void> {
  const { password, people } = JSON.parse(readFileSync("scripts/demo-people.json", "utf8")) as { password: string; people: Person[] };
  const passwords = createPasswords();
  const now = new Date();
  const openedAt = new Date(now.getTime() - 40 * 24 * 60 * 60 * 1000);
  const passwordHash = await passwords.hash(password);
  const services: Services = {
    stripe: createStripe({ secretKey: process.env.STRIPE_SECRET_KEY ?? "", apiUrl: process.env.STRIPE_API_URL }),
    stripeWebhookSecret: process.env.STRIPE_WEBHOOK_SECRET ?? "",
    uploads: createUploads({ token: process.env.UPLOADTHING_TOKEN ?? "", apiUrl: process.env.UPLOADTHING_API_URL, ingestUrl: process.env.UPLOADTHING_INGEST_URL, fileUrl: process.env.UPLOADTHING_FILE_URL }),
    mailer: { send: () => Promise.reject(new Error("the demonstration sends no mail while it is loaded")) },
    reportRenderer: { render: renderInProcess },
    passwords,
    publicOrigin: process.env.PUBLIC_ORIGIN ?? "",
  };
  const setting = { db, services, passwordHash, now: openedAt };
  const ids = await addPeople(setting, people);
  const marram = await openDemoLaboratory(setting, ids, {
    name: "Marram Quay Gem Testing", slug: "marram-quay", prefix: "MQ", isSolePractice: false, owner: "rosalind",
    addressLines: ["4 Saltmarsh Row", "Port Ellery"], phone: "+00 0000 000000", email: "desk@marramquay.example",
    members: [
      { key: "rosalind", roles: ["owner"], title: "Owner" },
      { key: "ifeoma", roles: ["gemmologist"], title: "Gemmologist" },
      { key: "mattias", roles: ["gemmologist"], title: "Gemmologist" },
      { key: "teodora", roles: ["appraiser"], title: "Appraiser" },
      { key: "joss", roles: ["desk"], title: "Desk" },
    ],
  });
  for (const story of [...marramStories].sort((a, b) => b.daysAgo - a.daysAgo)) {
    await tellStory(marram, story, { now, cast: { desk: "joss", examiner: "ifeoma", checker: "mattias", appraiser: "teodora", owner: "rosalind" } });
  }
  await checkInstrumentsAgain(marram, { owner: "rosalind", now });
  await saveDemoParcel(marram.as("mattias", new Date(now.getTime() - 26 * 60 * 60 * 1000)));
  const tarn = await openDemoLaboratory(setting, ids, {
    name: "Tarn & Vale Valuers", slug: "tarn-and-vale", prefix: "TV", isSolePractice: true, owner: "corwen",
    addressLines: ["The Tannery", "Upper Tarn"], phone: "+00 0000 000001", email: "post@tarnandvale.example",
    members: [{ key: "corwen", roles: ["owner", "gemmologist", "appraiser", "desk"], title: "Gemmologist and valuer" }],
  });
  for (const story of tarnStories) await tellStory(tarn, story, { now, cast: { desk: "corwen", examiner: "corwen", checker: "corwen", appraiser: "corwen", owner: "corwen" } });
  await passwords.close();
}
