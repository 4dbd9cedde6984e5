import { expect, test } from "vitest";
import { newId } from "#app/db/new-id.server.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import { handOverForm, releaseForm } from "#app/features/custody/custody-forms.server.ts";
import { takeInForm } from "#app/features/take-ins/take-in-forms.server.ts";
import { parseForm } from "../../setup/parse-form.ts";

const [client, balance] = [shortRef(newId<"client">()), shortRef(newId<"instrument">())];
const complete: Record<string, string | string[]> = {
  requestId: newId<"request">(),
  clientName: "Ardenne",
  client,
  newClientEmail: "",
  newClientPhone: "",
  newClientAddress: "",
  handedOverBy: "L. Ardenne",
  capacity: "executor",
  returnMethod: "collect",
  clientStatements: "",
  dueOn: "2026-12-08",
  place: "Safe 1",
  isFeeAgreed: "on",
  "items[0].description": "Red oval",
  "items[0].mount": "loose",
  "items[0].stoneCount": "1",
  "items[0].massText": "2,143",
  "items[0].massUnit": "ct",
  "items[0].balanceId": balance,
  "items[0].condition": "None seen with 10×",
  "items[0].declaredValue": "",
  "items[0].consents": ["dryCloth", "ultraviolet"],
  "items[0].seal": "",
};
const form = takeInForm({ currency: "EUR" });
const without = (name: string) => Object.fromEntries(Object.entries(complete).filter(([key]) => key !== name));

test("a complete form is read: a decimal comma, several ticks, nothing declared", () => {
  const { value } = parseForm(form, complete);
  expect(value).toMatchObject({ isValuationWanted: false, items: [{ massText: "2.143", declaredValue: null, consents: ["dryCloth", "ultraviolet"], seal: "", stoneCount: 1 }] });
});

test.each(["requestId", "handedOverBy", "capacity", "returnMethod", "dueOn", "place", "isFeeAgreed", "items[0].description", "items[0].mount", "items[0].stoneCount", "items[0].massText", "items[0].massUnit", "items[0].balanceId", "items[0].condition"])(
  "a form without %s says so beside it",
  (name) => {
    const { error } = parseForm(form, without(name));
    expect(error?.[name]?.[0]).toMatch(/^[A-Z].*\.$/);
    expect(error?.[name]?.[0]).not.toMatch(/expected|invalid/i);
  },
);

test.each([
  ["items[0].description", "ruby", "“ruby” is a conclusion"],
  ["items[0].description", "x".repeat(10_000), "At most 300 characters."],
  ["items[0].condition", "silver worn", "“silver” is a conclusion"],
  ["items[0].massText", "-1", "more than zero"],
  ["items[0].massText", "1000000000", "is the unit right?"],
  ["items[0].massText", "heavy", "as the balance shows it"],
  ["items[0].massText", "💎", "as the balance shows it"],
  ["items[0].stoneCount", "-1", "whole number"],
  ["items[0].stoneCount", "1.5", "whole number"],
  ["items[0].stoneCount", "0", "at least one"],
  ["items[0].stoneCount", "1000", "divide the parcel"],
  ["items[0].declaredValue", "-5", "Write the amount in EUR"],
  ["items[0].declaredValue", "lots", "Write the amount in EUR"],
  ["items[0].declaredValue", "9999999999999", "more than can be entered"],
  ["items[0].balanceId", "nonsense", "Choose the balance."],
  ["items[0].consents", "acid", "none of the consents"],
  ["dueOn", "2026-02-30", "as a date"],
  ["newClientEmail", "nonsense", "not an e-mail address"],
  ["requestId", "1", "not complete"],
  ["clientStatements", "x".repeat(10_000), "At most 4000 characters."],
])("%s of “%.20s” is refused", (name, typed, part) => {
  const { error } = parseForm(form, { ...complete, [name]: typed });
  const messages = Object.entries(error ?? {}).filter(([key]) => key.startsWith(name)).flatMap(([, all]) => all ?? []);
  expect(messages.join(" ")).toContain(part);
});

test.each([["6 500.00", 650_000], ["6500", 650_000], ["6500,5", 650_050], ["6 500.00 EUR", 650_000]])("a declared value of “%s” is %d cents", (typed, amountMinor) => {
  expect(parseForm(form, { ...complete, "items[0].declaredValue": typed }).value?.items[0]?.declaredValue).toBe(amountMinor);
});

test("a client is chosen, or new by its name, and nothing between", () => {
  expect(parseForm(form, complete).value?.client).toHaveProperty("id");
  expect(parseForm(form, { ...complete, client: "new", newClientAddress: "1 Quay\nPort Ellery" }).value?.client).toEqual({ new: { name: "Ardenne", contactName: "", email: "", phone: "", addressLines: ["1 Quay", "Port Ellery"], note: "" } });
  expect(parseForm(form, without("client")).error?.clientName?.[0]).toContain("Choose the client");
  expect(parseForm(form, { ...complete, client: "new", clientName: "" }).error?.clientName).toEqual(["Write the client's name."]);
  expect(parseForm(form, { ...complete, client: "../../x" }).status).toBe("error");
});

test("a hand-over and a release name what is missing", () => {
  expect(Object.keys(parseForm(handOverForm, {}).error ?? {}).sort()).toEqual(["itemNumber", "massUnit", "purpose", "requestId", "toPlace"]);
  expect(Object.keys(parseForm(releaseForm, {}).error ?? {}).sort()).toEqual(["collectedBy", "idSeen", "itemNumber", "massUnit", "requestId"]);
  const handOver = { requestId: newId<"r">(), itemNumber: "MQ-26-0001", purpose: "toBench", toPlace: "Bench 2", holder: "", massText: "", massUnit: "ct", seal: "", remark: "" };
  expect(parseForm(handOverForm, handOver).value).toMatchObject({ massText: "", holder: undefined, remark: "" });
  for (const massText of ["-1", "abc", "1e9", "1000000000"]) expect(parseForm(handOverForm, { ...handOver, massText }).error).toHaveProperty("massText");
  expect(parseForm(handOverForm, { ...handOver, purpose: "release" }).error).toHaveProperty("purpose");
});
