import { expect, test } from "vitest";
import { createClient } from "#app/features/clients/create-client.server.ts";
import { createClientForm } from "#app/features/clients/client-forms.server.ts";
import { findClients } from "#app/features/clients/find-clients.server.ts";
import { getClient } from "#app/features/clients/get-client.server.ts";
import { grantTerms } from "#app/features/clients/grant-terms.server.ts";
import { listClients } from "#app/features/clients/list-clients.server.ts";
import { updateClient } from "#app/features/clients/update-client.server.ts";
import { listStones } from "#app/features/stones/list-stones.server.ts";
import { parseForm } from "../../setup/parse-form.ts";
import { aClient, aLab, aMember } from "../../setup/factories.ts";
import { aRequestId, aTakenInItem } from "../../setup/take-in-factory.ts";

const details = { name: "Ferro & Daughters", contactName: "", email: "", phone: "", addressLines: ["4 Quay"], note: "" };

test("a client made twice from one form is one client", async () => {
  const ctx = await aLab();
  const requestId = aRequestId<"client">();
  expect(await createClient(ctx, { requestId, ...details })).toBe(requestId);
  expect(await createClient(ctx, { requestId, ...details })).toBe(requestId);
  expect((await listClients(ctx)).clients).toHaveLength(1);
});

test("a client is changed once per version, and a stale change says so", async () => {
  const ctx = await aLab();
  const id = await aClient(ctx);
  await updateClient(ctx, id, { ...details, version: 1 });
  await expect(updateClient(ctx, id, { ...details, name: "Other", version: 1 })).rejects.toMatchObject({ code: "conflict" });
  expect(await getClient(ctx, id)).toMatchObject({ name: "Ferro & Daughters", version: 2 });
});

test("a renamed client's stones are found by the new name", async () => {
  const ctx = await aLab();
  await aTakenInItem(ctx);
  const { clients: [client] } = await listClients(ctx);
  await updateClient(ctx, client!.id, { ...details, name: "Zephyr Trust", version: 1 });
  expect((await listStones(ctx, { search: "zephyr" })).stones).toHaveLength(1);
  expect((await listStones(ctx, { search: "ardenne" })).stones).toHaveLength(0);
});

test("a client's page lists their take-ins, with what was handed over", async () => {
  const ctx = await aLab();
  const { takeInNumber } = await aTakenInItem(ctx);
  const { clients: [client] } = await listClients(ctx);
  expect((await getClient(ctx, client!.id)).takeIns).toMatchObject([{ number: takeInNumber, items: "Purplish red oval, transparent" }]);
});

test("only an owner grants account terms, and it is written who did", async () => {
  const ctx = await aLab();
  const id = await aClient(ctx);
  const desk = await aMember(ctx, ["desk"]);
  await expect(grantTerms(desk, id, { terms: "account", version: 1 })).rejects.toMatchObject({ code: "forbidden" });
  await grantTerms(ctx, id, { terms: "account", version: 1 });
  expect(await getClient(ctx, id)).toMatchObject({ terms: "account", termsGrantedBy: ctx.person.name, version: 2 });
  await grantTerms(ctx, id, { terms: "account", version: 1 });
  await expect(grantTerms(ctx, id, { terms: "prepaid", version: 1 })).rejects.toMatchObject({ code: "conflict" });
  await grantTerms(ctx, id, { terms: "prepaid", version: 2 });
  expect(await getClient(ctx, id)).toMatchObject({ terms: "prepaid", termsGrantedBy: null });
});

test("another laboratory's client is not found by any way", async () => {
  const [ours, theirs] = [await aLab(), await aLab()];
  const id = await aClient(ours);
  await expect(getClient(theirs, id)).rejects.toMatchObject({ code: "not_found" });
  await expect(updateClient(theirs, id, { ...details, version: 1 })).rejects.toMatchObject({ code: "not_found" });
  await expect(grantTerms(theirs, id, { terms: "account", version: 1 })).rejects.toMatchObject({ code: "not_found" });
  expect(await findClients(theirs, "Ardenne")).toEqual([]);
  expect((await listClients(theirs)).clients).toEqual([]);
});

test("a gemmologist sees clients and changes none", async () => {
  const ctx = await aMember(await aLab(), ["gemmologist"]);
  await expect(createClient(ctx, { requestId: aRequestId<"client">(), ...details })).rejects.toMatchObject({ code: "forbidden" });
  expect(await findClients(ctx, "Fe")).toEqual([]);
});

test("typing finds clients by the beginning of their name, without regard to case and accents; % finds nothing", async () => {
  const ctx = await aLab();
  for (const name of ["Élan Jewels", "Elan Trading", "Other"]) await aClient(ctx, { name });
  expect((await findClients(ctx, "ela")).map((client) => client.name)).toEqual(["Élan Jewels", "Elan Trading"]);
  expect(await findClients(ctx, "%%")).toEqual([]);
  expect(await findClients(ctx, "e")).toEqual([]);
});

test("walking the pages forth and back shows every client once, namesakes too", async () => {
  const ctx = await aLab();
  for (const name of ["A", "B", "B", "B", "C", "D", "D"]) await aClient(ctx, { name });
  const seen: string[] = [];
  let page = await listClients(ctx, { pageSize: 2 });
  expect(page.earlier).toBeNull();
  for (;;) {
    seen.push(...page.clients.map((client) => client.id));
    if (!page.later) break;
    page = await listClients(ctx, { pageSize: 2, after: page.later });
  }
  expect(new Set(seen).size).toBe(7);
  const back = await listClients(ctx, { pageSize: 2, before: page.earlier! });
  expect(back.clients.map((client) => client.id)).toEqual(seen.slice(4, 6));
});

test.each([
  [{ name: "" }, "name"],
  [{ name: "x".repeat(10_000) }, "name"],
  [{ name: "a\u0000b" }, "name"],
  [{ name: "A", email: "not an address" }, "email"],
  [{ name: "A", addressLines: "1\n2\n3\n4\n5\n6\n7" }, "addressLines"],
  [{ name: "A", phone: "0".repeat(41) }, "phone"],
])("a form with %o is refused", (fields, field) => {
  const submission = parseForm(createClientForm, { requestId: aRequestId(), ...fields });
  expect(Object.keys(submission.error ?? {})).toContain(field);
});

test("a form with a name alone is enough", () => {
  expect(parseForm(createClientForm, { requestId: aRequestId(), name: "A", contactName: "", email: "", phone: "", addressLines: "", note: "" }).value).toMatchObject({ name: "A", email: "", addressLines: [], note: "" });
});

test("emoji and markup in a name are only text", () => {
  expect(parseForm(createClientForm, { requestId: aRequestId(), name: "  💎 <script>alert(1)</script>  & Sons " }).value).toMatchObject({ name: "💎 <script>alert(1)</script> & Sons", addressLines: [] });
});
