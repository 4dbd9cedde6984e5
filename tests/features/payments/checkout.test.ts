import { expect, test } from "vitest";
import { refundInvoice } from "#app/features/invoices/refund-invoice.server.ts";
import { voidInvoice } from "#app/features/invoices/void-invoice.server.ts";
import { recordDeskPayment } from "#app/features/invoices/record-desk-payment.server.ts";
import { startCheckout } from "#app/features/payments/start-checkout.server.ts";
import { anInvoice, invoiceRow } from "../../setup/an-invoice.ts";
import { aLab, testNow } from "../../setup/factories.ts";
import { stripeServices } from "../../setup/stripe-services.ts";
import { testServices } from "../../setup/test-services.ts";

test("the fee is the price list's, with tax by line", async () => {
  const lab = await aLab();
  const invoice = await anInvoice(lab, { stoneCount: 2 });
  expect(await invoiceRow(lab, invoice.id)).toMatchObject({ netMinor: 23000, taxMinor: 4600, totalMinor: 27600, state: "open" });
});

test("a pay link opens one checkout, however often it is pressed", async () => {
  await using stripe = await stripeServices();
  const lab = await aLab({ services: stripe.services });
  const invoice = await anInvoice(lab);
  const app = { db: lab.db, now: testNow, services: stripe.services, clientAddress: "unknown" };
  const urls = await Promise.all([1, 2, 3, 4].map(() => startCheckout(app, { payToken: invoice.payToken })));
  expect(new Set(urls).size).toBe(1);
  expect(Object.keys(stripe.fake.data.sessions)).toHaveLength(1);
  expect(Object.values(stripe.fake.data.sessions)[0]).toMatchObject({ amount_total: 13800, currency: "eur" });
});

test("an unknown pay link leads nowhere", async () => {
  const lab = await aLab();
  await expect(startCheckout({ db: lab.db, now: testNow, services: lab.services, clientAddress: "x" }, { payToken: "A".repeat(43) })).rejects.toMatchObject({ code: "not_found" });
});

test("a payment service that is away charges nothing and says so", async () => {
  const lab = await aLab({ services: testServices() });
  const invoice = await anInvoice(lab);
  await expect(startCheckout({ db: lab.db, now: testNow, services: lab.services, clientAddress: "x" }, { payToken: invoice.payToken })).rejects.toMatchObject({ code: "unavailable" });
  expect((await invoiceRow(lab, invoice.id)).state).toBe("open");
});

test("a paid invoice cannot be paid at the desk as well", async () => {
  const lab = await aLab();
  const invoice = await anInvoice(lab);
  await recordDeskPayment(lab, { number: invoice.number, method: "cash", reference: "till 1" });
  await expect(recordDeskPayment(lab, { number: invoice.number, method: "cash", reference: "till 1" })).rejects.toMatchObject({ code: "conflict" });
  expect((await invoiceRow(lab, invoice.id)).state).toBe("paid");
});

test("two clerks who take the same money at once record it once", async () => {
  const lab = await aLab();
  const invoice = await anInvoice(lab);
  const results = await Promise.allSettled([1, 2, 3].map(() => recordDeskPayment(lab, { number: invoice.number, method: "transfer", reference: "bank" })));
  expect(results.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
});

test("voiding closes the open checkout first", async () => {
  await using stripe = await stripeServices();
  const lab = await aLab({ services: stripe.services });
  const invoice = await anInvoice(lab);
  await startCheckout({ db: lab.db, now: testNow, services: stripe.services, clientAddress: "x" }, { payToken: invoice.payToken });
  await voidInvoice(lab, { number: invoice.number, reason: "taken in twice" });
  expect(Object.values(stripe.fake.data.sessions)[0]!.status).toBe("expired");
  expect((await invoiceRow(lab, invoice.id)).state).toBe("void");
});

test("cash given back leaves the invoice refunded", async () => {
  const lab = await aLab();
  const invoice = await anInvoice(lab);
  await recordDeskPayment(lab, { number: invoice.number, method: "cash", reference: "till 1" });
  await refundInvoice(lab, { number: invoice.number, reason: "not examined" });
  expect((await invoiceRow(lab, invoice.id)).state).toBe("refunded");
});

test("another laboratory's invoice is not found", async () => {
  const [ours, theirs] = [await aLab(), await aLab()];
  const invoice = await anInvoice(theirs);
  await expect(voidInvoice(ours, { number: invoice.number, reason: "x" })).rejects.toMatchObject({ code: "not_found" });
  await expect(recordDeskPayment(ours, { number: invoice.number, method: "cash", reference: "x" })).rejects.toMatchObject({ code: "not_found" });
  await expect(refundInvoice(ours, { number: invoice.number, reason: "x" })).rejects.toMatchObject({ code: "not_found" });
});
