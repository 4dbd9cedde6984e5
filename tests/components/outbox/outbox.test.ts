import "fake-indexeddb/auto";
import fc from "fast-check";
import { expect, test } from "vitest";
import { askServer } from "#app/components/bench/outbox/ask-server.ts";
import { deedsOf, dropDeed, keepDeed, markRefused } from "#app/components/bench/outbox/outbox.ts";
import type { KeptDeed } from "#app/components/bench/outbox/outbox-store.ts";
import { sendOutbox, type Answer } from "#app/components/bench/outbox/send-outbox.ts";

let count = 0;
/** A person of their own, so that tests share the store and nothing else. */
const somebody = () => ({ person: `person-${++count}`, labSlug: "marram-quay" });
const aDeed = (whose: ReturnType<typeof somebody>, id: string) => ({ id: `${whose.person}-${id}`, kind: "reading" as const, ...whose, stoneCode: "MQ-26-0001-1", fields: [["kind", "weight"], ["weightCt", "2.143"]] as const, madeAt: "2026-12-01T10:00:00.000Z" });
const ask = (answer: (deed: KeptDeed) => Answer, whose: ReturnType<typeof somebody>) => ({ deeds: () => deedsOf(whose), ask: (deed: KeptDeed) => Promise.resolve(answer(deed)), drop: dropDeed, refuse: markRefused });

test("what waits is kept in the order of making, once an id, and shown to its maker alone", async () => {
  const [one, other] = [somebody(), somebody()];
  for (const id of ["b", "a", "c", "a"]) await keepDeed(aDeed(one, id));
  expect((await deedsOf(one)).map(({ id }) => id.split("-").at(-1))).toEqual(["b", "a", "c"]);
  expect(await deedsOf(other)).toEqual([]);
  expect(await deedsOf({ ...one, labSlug: "tarn-vale" })).toEqual([]);
  expect(await deedsOf(one, "MQ-26-0002-1")).toEqual([]);
});

test("a refused deed stays with its reason and holds nothing up", async () => {
  const whose = somebody();
  for (const id of ["a", "b", "c"]) await keepDeed(aDeed(whose, id));
  const outcome = await sendOutbox(ask(({ id }) => (id.endsWith("-b") ? { is: "refused", message: "This stone is concluded." } : { is: "kept" }), whose));
  expect(outcome).toEqual({ sent: 2, refused: 1, stoppedBy: null });
  expect(await deedsOf(whose)).toMatchObject([{ refusal: "This stone is concluded." }]);
  expect(await sendOutbox(ask(() => ({ is: "kept" }), whose))).toEqual({ sent: 0, refused: 0, stoppedBy: null });
});

test("cut at any moment, before or after the server kept it, all arrive once and in order", async () => {
  await fc.assert(
    fc.asyncProperty(fc.integer({ min: 1, max: 12 }), fc.array(fc.constantFrom("through", "lost on the way", "answer lost"), { maxLength: 40 }), async (deedCount, line) => {
      const whose = somebody();
      // A server that keeps a deed of one id once, as ours does by the request's id.
      const kept: string[] = [];
      const fates = [...line];
      const server = ({ id }: KeptDeed): Answer => {
        const fate = fates.shift() ?? "through";
        if (fate !== "lost on the way" && !kept.includes(id)) kept.push(id);
        return fate === "through" ? { is: "kept" } : { is: "later", because: "line" };
      };
      for (let at = 0; at < deedCount; at++) {
        await keepDeed(aDeed(whose, String(at)));
        await sendOutbox(ask(server, whose));
      }
      while ((await deedsOf(whose)).length > 0) await sendOutbox(ask(server, whose));
      expect(kept).toEqual(Array.from({ length: deedCount }, (_, at) => aDeed(whose, String(at)).id));
    }),
    { numRuns: 60 },
  );
});

const deed = { ...aDeed({ person: "p", labSlug: "marram-quay" }, "x"), place: 1, refusal: null };
const answering = (response: Response | Error) => (async () => {
  if (response instanceof Error) throw response;
  return response;
}) as typeof fetch;

test.each<[string, Response | Error, Answer]>([
  ["kept", Response.json({ kept: true, sequence: 4, warnings: [] }), { is: "kept" }],
  ["refused with a sentence", Response.json({ message: "The client has not agreed." }, { status: 422 }), { is: "refused", message: "The client has not agreed." }],
  ["no line", new TypeError("fetch failed"), { is: "later", because: "line" }],
  ["a server that restarts", new Response("", { status: 503 }), { is: "later", because: "line" }],
  ["too many at once", Response.json({ message: "Wait." }, { status: 429 }), { is: "later", because: "line" }],
  ["a gateway's page", new Response("<h1>hotel</h1>", { status: 200 }), { is: "later", because: "line" }],
  ["a stranger's 404", new Response("nothing here", { status: 404 }), { is: "later", because: "line" }],
  ["nobody signed in", Response.json({}, { status: 401 }), { is: "later", because: "signedOut" }],
])("what the server's answer means: %s", async (_, response, expected) => {
  expect(await askServer(deed, answering(response))).toEqual(expected);
});

test("a deed is sent with both: what its form said, and when by this device", async () => {
  let sent: { url: string; body: FormData } | undefined;
  await askServer(deed, (async (url: string, { body }: RequestInit) => {
    sent = { url, body: body as FormData };
    return Response.json({ kept: true });
  }) as typeof fetch);
  expect(sent!.url).toBe("/lab/marram-quay/stones/MQ-26-0001-1/sent-readings");
  expect(Object.fromEntries(sent!.body)).toEqual({ kind: "weight", weightCt: "2.143", madeAt: "2026-12-01T10:00:00.000Z" });
});
