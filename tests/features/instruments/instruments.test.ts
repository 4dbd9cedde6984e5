import { expect, test } from "vitest";
import { editInstrument } from "#app/features/instruments/edit-instrument.server.ts";
import { findBalances } from "#app/features/instruments/find-balances.server.ts";
import { getInstrument } from "#app/features/instruments/get-instrument.server.ts";
import { editInstrumentForm, instrumentCheckForm, registerInstrumentForm, type InstrumentCheckInput } from "#app/features/instruments/instrument-forms.server.ts";
import { listInstruments } from "#app/features/instruments/list-instruments.server.ts";
import { recordInstrumentCheck } from "#app/features/instruments/record-instrument-check.server.ts";
import { registerInstrument } from "#app/features/instruments/register-instrument.server.ts";
import { parseForm } from "../../setup/parse-form.ts";
import { aLab, aMember, anInstrument, later } from "../../setup/factories.ts";
import { aRequestId } from "../../setup/take-in-factory.ts";

const details = { kind: "refractometer" as const, name: "R2", description: "", serial: "", location: "Bench 2", resolution: 0.001, standardUncertainty: 0.0015, upperLimit: 1.81, prismIndex: null };
const check = (fields: Partial<InstrumentCheckInput> = {}): InstrumentCheckInput => ({
  requestId: aRequestId<"instrumentCheck">(),
  referenceMaterial: "Quartz, ordinary ray",
  nominal: { value: 1.544, text: "1.544" },
  reading: { value: 1.545, text: "1.545" },
  limit: { value: 0.001, text: "0.001" },
  tempC: 21.5,
  nextDueOn: "2026-12-08",
  note: "",
  ...fields,
});

test("an instrument registered twice from one form is one; a name is used once", async () => {
  const ctx = await aLab();
  const requestId = aRequestId<"instrument">();
  await registerInstrument(ctx, { requestId, ...details });
  await registerInstrument(ctx, { requestId, ...details });
  await expect(registerInstrument(ctx, { requestId: aRequestId<"instrument">(), ...details })).rejects.toMatchObject({ code: "conflict", fieldErrors: { name: [expect.stringContaining("R2")] } });
  expect(await listInstruments(ctx)).toHaveLength(1);
});

test("a check at its limit passes, beyond it the instrument goes out of service at once", async () => {
  const ctx = await aLab();
  const id = await anInstrument(ctx, { name: "B1" });
  expect(await recordInstrumentCheck(ctx, id, check())).toEqual({ isPassed: true });
  expect(await findBalances(ctx)).toMatchObject([{ name: "B1", isLastCheckPassed: true, nextDueOn: "2026-12-08" }]);
  expect(await recordInstrumentCheck(later(ctx, 1000), id, check({ reading: { value: 1.5451, text: "1.5451" } }))).toEqual({ isPassed: false });
  expect(await listInstruments(ctx)).toMatchObject([{ status: "outOfService", isLastCheckPassed: false }]);
  expect(await findBalances(ctx)).toEqual([]);
  expect((await getInstrument(ctx, id)).checks.map((one) => one.isPassed)).toEqual([false, true]);
});

test("a check sent twice is recorded once", async () => {
  const ctx = await aLab();
  const id = await anInstrument(ctx);
  const once = check();
  await recordInstrumentCheck(ctx, id, once);
  await recordInstrumentCheck(ctx, id, once);
  expect((await getInstrument(ctx, id)).checks).toHaveLength(1);
});

test("a stale edit is refused, and an edit out of service needs its reason", async () => {
  const ctx = await aLab();
  const id = await anInstrument(ctx, { name: "B1" });
  const edit = { ...details, kind: "balance" as const, name: "B1", status: "restricted" as const, statusReason: "Only above 1 ct", version: 1 };
  await editInstrument(ctx, id, edit);
  await expect(editInstrument(ctx, id, edit)).rejects.toMatchObject({ code: "conflict" });
  expect(Object.keys(parseForm(editInstrumentForm, { version: "2", kind: "balance", name: "B1", status: "outOfService", statusReason: "" }).error ?? {})).toEqual(["statusReason"]);
  expect(parseForm(editInstrumentForm, { version: "2", kind: "balance", name: "B1", status: "inService", statusReason: "", resolution: "0,001" }).value).toMatchObject({ resolution: 0.001, upperLimit: null, serial: "" });
});

test("another laboratory's instrument is not found, and the desk changes none", async () => {
  const [ours, theirs] = [await aLab(), await aLab()];
  const id = await anInstrument(ours);
  await expect(getInstrument(theirs, id)).rejects.toMatchObject({ code: "not_found" });
  await expect(recordInstrumentCheck(theirs, id, check())).rejects.toMatchObject({ code: "not_found" });
  await expect(editInstrument(theirs, id, { ...details, status: "inService", statusReason: "", version: 1 })).rejects.toMatchObject({ code: "not_found" });
  await expect(recordInstrumentCheck(await aMember(ours, ["desk"]), id, check())).rejects.toMatchObject({ code: "forbidden" });
  await expect(recordInstrumentCheck(ours, id, check({ nextDueOn: "2026-12-01" }))).rejects.toMatchObject({ code: "invalid_input" });
});

test.each([
  [{ resolution: "abc" }, "resolution"],
  [{ resolution: "-1" }, "resolution"],
  [{ resolution: "0.0000001" }, "resolution"],
  [{ upperLimit: "1000000000" }, "upperLimit"],
  [{ name: "" }, "name"],
  [{ name: "x".repeat(10_000) }, "name"],
  [{ kind: "telescope" }, "kind"],
])("a registration with %o is refused", (fields, field) => {
  expect(Object.keys(parseForm(registerInstrumentForm, { requestId: aRequestId(), kind: "balance", name: "B1", ...fields }).error ?? {})).toContain(field);
});

test("numbers of a check take a decimal comma and keep their digits", () => {
  const { value } = parseForm(instrumentCheckForm, { requestId: aRequestId(), referenceMaterial: "Check weight", nominal: "1,0000", reading: "1,0010", limit: "0,002", tempC: "21,46", nextDueOn: "2026-12-02" });
  expect(value).toMatchObject({ reading: { value: 1.001, text: "1.0010" }, tempC: 21.5 });
  for (const reading of ["", "text", "1e9", "1000000000", "💎", "x".repeat(10_000)]) {
    expect(parseForm(instrumentCheckForm, { requestId: aRequestId(), referenceMaterial: "W", nominal: "1", reading, limit: "1", nextDueOn: "2026-12-02" }).status).toBe("error");
  }
});
