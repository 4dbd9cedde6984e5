import { createHmac } from "node:crypto";
import { like } from "drizzle-orm";
import { expect, test } from "vitest";
import { providerEvents } from "#app/db/schema/index.ts";
import { handleStripeEvent } from "#app/features/payments/handle-stripe-event.server.ts";
import { aLab } from "../../setup/factories.ts";
import { sized } from "../../setup/torture.ts";

const secret = "whsec_test";
const hmac = (text: string, key = secret) => createHmac("sha256", key).update(text).digest("hex");

// Quality bar T6: 2,000 forgeries of ten kinds in `npm run torture`, a tenth in every run, seeded by their index.
const forgeryCount = sized({ always: 200, whole: 2_000 });
const kinds: Array<{ name: string; forge: (body: string, nowS: number) => { rawBody: string; signature: string | null } }> = [
  { name: "another secret", forge: (body, t) => ({ rawBody: body, signature: `t=${t},v1=${hmac(`${t}.${body}`, "whsec_other")}` }) },
  { name: "an altered body", forge: (body, t) => ({ rawBody: body.replace("evt_", "evx_"), signature: `t=${t},v1=${hmac(`${t}.${body}`)}` }) },
  { name: "an altered time", forge: (body, t) => ({ rawBody: body, signature: `t=${t + 1},v1=${hmac(`${t}.${body}`)}` }) },
  { name: "an old time", forge: (body, t) => ({ rawBody: body, signature: `t=${t - 302},v1=${hmac(`${t - 302}.${body}`)}` }) },
  { name: "no signature", forge: (body) => ({ rawBody: body, signature: null }) },
  { name: "an empty signature", forge: (body) => ({ rawBody: body, signature: "" }) },
  { name: "two wrong signatures", forge: (body, t) => ({ rawBody: body, signature: `t=${t},v1=${hmac("a")},v1=${hmac("b")}` }) },
  { name: "only the old scheme", forge: (body, t) => ({ rawBody: body, signature: `t=${t},v0=${hmac(`${t}.${body}`)}` }) },
  { name: "JSON encoded anew", forge: (body, t) => ({ rawBody: JSON.stringify(JSON.parse(body), null, 1), signature: `t=${t},v1=${hmac(`${t}.${body}`)}` }) },
  { name: "no time", forge: (body, t) => ({ rawBody: body, signature: `v1=${hmac(`${t}.${body}`)}` }) },
];

test(`${forgeryCount} forged events are refused and leave nothing behind`, async () => {
  const lab = await aLab();
  const app = { db: lab.db, now: lab.now, services: lab.services, clientAddress: "127.0.0.1" };
  const mark = `evt_forged_${lab.laboratory.prefix}`;
  for (let i = 0; i < forgeryCount; i++) {
    const kind = kinds[i % kinds.length]!;
    const body = JSON.stringify({ id: `${mark}_${i}`, object: "event", type: "checkout.session.completed", data: { object: { id: "cs_1", object: "checkout.session" } } });
    const forged = kind.forge(body, Math.floor(Date.now() / 1000));
    await expect(handleStripeEvent(app, forged), kind.name).rejects.toMatchObject({ code: "invalid_input", status: 422 });
  }
  expect(await lab.db.select().from(providerEvents).where(like(providerEvents.eventId, `${mark}%`))).toEqual([]);
});
