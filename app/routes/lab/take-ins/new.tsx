import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { useEffect, useState } from "react";
import { data, Form, redirect, useFetcher, useNavigation } from "react-router";
import { ClientChoice, type ClientOption } from "#app/components/take-in/client-choice.tsx";
import { FeeCard } from "#app/components/take-in/fee-card.tsx";
import { HeldCard } from "#app/components/take-in/held-card.tsx";
import { ItemFields, type ItemFieldset } from "#app/components/take-in/item-fields.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { CheckboxField } from "#app/components/ui/choice-field.tsx";
import { checkboxProps, fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";
import { calendarDateIn, formatInstant } from "#app/domain/calendar-date.ts";
import { parseAmount } from "#app/domain/money/parse-amount.ts";
import { capacities, capacityNames, type MountState } from "#app/domain/take-in.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { addWorkingDays, formatWeekdayDate } from "#app/domain/working-days.ts";
import { findClients } from "#app/features/clients/find-clients.server.ts";
import { getClient } from "#app/features/clients/get-client.server.ts";
import { getCustodyStanding } from "#app/features/custody/get-custody-standing.server.ts";
import { findBalances } from "#app/features/instruments/find-balances.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { examinedCount } from "#app/features/take-ins/examined-count.ts";
import { listOfferedServices } from "#app/features/take-ins/list-offered-services.server.ts";
import { servicesOf } from "#app/features/take-ins/services-of.ts";
import { takeInForm } from "#app/features/take-ins/take-in-forms.server.ts";
import { takeInItems } from "#app/features/take-ins/take-in-items.server.ts";
import { mostItems } from "#app/features/take-ins/take-in-limits.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/new";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const { laboratory, now } = ctx;
  const clientId = idFromShortRef<"client">(url.searchParams.get("client") ?? "");
  const [prices, balances, standing, client] = await orResponse(Promise.all([listOfferedServices(ctx), findBalances(ctx), getCustodyStanding(ctx), clientId ? getClient(ctx, clientId) : null]));
  const today = calendarDateIn(now, laboratory.timeZone);
  return {
    requestId: newRequestId(),
    prices,
    balances: balances.map(({ ref, name, lastCheckedAt, isLastCheckPassed, nextDueOn }) => ({
      ref,
      name,
      checked: !lastCheckedAt ? "never checked" : isLastCheckPassed === false ? "last check failed" : `checked ${formatInstant(lastCheckedAt, laboratory.timeZone)}${nextDueOn && nextDueOn < today ? ", due again" : ""}`,
    })),
    standing,
    client: client ? { ref: client.ref, name: client.name, contactName: client.contactName, place: client.addressLines.at(-1) ?? "" } : null,
    now: formatInstant(now, laboratory.timeZone),
    dueOn: addWorkingDays(today, laboratory.usualDays),
    today,
    laboratory: { isSolePractice: laboratory.isSolePractice, taxShareE4: laboratory.taxShareE4, taxLabel: laboratory.taxLabel, currency: laboratory.currency },
    isOwner: ctx.roles.includes("owner"),
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "takeIn.create");
  const formData = await request.formData();
  const typedName = String(formData.get("clientName") ?? "");
  const submission = parseWithZod(formData, { schema: takeInForm({ currency: ctx.laboratory.currency }) });
  const found = async () => ({ typed: typedName, clients: (await orResponse(findClients(ctx, typedName))).map(({ ref, name, contactName, place }) => ({ ref, name, contactName, place })) });
  if (formData.get("find") === "client") {
    // Only a search: what was typed comes back, nothing is judged.
    const { initialValue } = submission.reply({ formErrors: [""] });
    return data({ result: { initialValue }, found: await found() });
  }
  const withFound = async (answer: ReturnType<typeof formInvalid>) => data({ ...answer.data, found: await found() }, answer.init ?? {});
  if (submission.status !== "success") return withFound(formInvalid(submission));
  try {
    const { number } = await takeInItems(ctx, submission.value);
    return redirect(`/lab/${params.labSlug}/take-ins/${number}`, { headers: { "Set-Cookie": await noticeHeader(`Taken in as ${number}. Photographs, labels and the receipt are on this page.`) } });
  } catch (error) {
    return withFound(formRefused(submission, error));
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Take-in · Isogyre" }];

type ItemTyped = { description: string; mount: string; stoneCount: string; massText: string; massUnit: string; balanceId: string; condition: string; declaredValue: string; consents: string[]; seal: string };
type Typed = {
  requestId: string;
  clientName: string;
  client: string;
  newClientEmail: string;
  newClientPhone: string;
  newClientAddress: string;
  handedOverBy: string;
  capacity: string;
  returnMethod: string;
  clientStatements: string;
  dueOn: string;
  place: string;
  isValuationWanted: string;
  isFeeAgreed: string;
  limitOverrideNote: string;
  items: ItemTyped[];
};

export default function TakeInRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { requestId, prices, balances, standing, client, now, dueOn, today, laboratory, isOwner } = loaderData;
  const emptyItem: Partial<ItemTyped> = { mount: "loose", stoneCount: "1", massUnit: "ct", balanceId: balances.length === 1 ? balances[0]!.ref : "", consents: ["dryCloth"] };
  const [form, fields] = useForm<Typed>({
    lastResult: actionData?.result,
    defaultValue: { requestId, clientName: client?.name, client: client?.ref, dueOn, place: "Safe 1", returnMethod: "collect", capacity: "owner", items: [emptyItem as ItemTyped] },
  });
  const items = fields.items.getFieldList();
  const search = useFetcher<{ typed: string; clients: ClientOption[] }>();
  const found = search.data ?? actionData?.found;
  const isTakingIn = useNavigation().state === "submitting";
  const options = found?.clients ?? (client ? [client] : []);
  useWarnBeforeLeaving(form.dirty);

  const typedItems = (form.value?.items ?? []) as Array<Partial<ItemTyped> | undefined>;
  const stoneCount = Math.max(1, typedItems.reduce((sum, item) => sum + stonesOf(item), 0));
  const addedMinor = typedItems.reduce((sum, item) => sum + (parseAmount(item?.declaredValue ?? "", laboratory.currency) ?? 0), 0);
  const isValuationWanted = (form.value as { isValuationWanted?: string } | undefined)?.isValuationWanted === "on";

  return (
    <>
      <PageHeader title="Take-in" note={`The receipt gets its number when it is taken in · ${now}`} />
      <Form method="post" {...getFormProps(form)}>
        {/* Pressing Enter in a field sends the first button of the form: that must be the one that takes in. */}
        <button className="sr-only" tabIndex={-1} aria-hidden="true" />
        <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
        <FormAlert errors={form.errors} id={form.errorId} />
        {form.status === "error" && !form.errors ? <FormAlert errors={["Nothing was taken in yet: something is missing or not right. It is said beside each field."]} /> : null}
        <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_22rem] xl:gap-7">
          <Card>
            <fieldset className="px-4.5 pt-4 pb-5">
              <legend className="sr-only">From whom</legend>
              <h2 className="text-[18px]">From whom</h2>
              <p className="mb-3 text-ink-2">The person handing over the goods, and whether they may.</p>
              <div className="grid gap-3.5 sm:grid-cols-3">
                <div>
                  <TextField
                    key={fields.clientName.key}
                    {...fieldProps(fields.clientName)}
                    label="Client"
                    autoComplete="off"
                    maxLength={120}
                    onChange={(event) => {
                      const typed = event.currentTarget.value.trim();
                      if (typed.length >= 2) void search.load(`/lab/${params.labSlug}/clients/find?q=${encodeURIComponent(typed)}`);
                    }}
                  />
                  <button name="find" value="client" formNoValidate className="mt-1 cursor-pointer text-[13px] text-tint underline">
                    Find
                  </button>
                </div>
                <TextField key={fields.handedOverBy.key} {...fieldProps(fields.handedOverBy)} label="Handed over by" autoComplete="off" maxLength={120} />
                <SelectField key={fields.capacity.key} {...fieldProps(fields.capacity)} label="In what capacity" options={capacities.map((value) => ({ value, label: capacityNames[value] }))} />
              </div>
              {found || client ? (
                <ClientChoice
                  key={`${found?.typed ?? ""}:${options.map((option) => option.ref).join()}`}
                  options={options}
                  chosen={fields.client.initialValue ?? (options.length === 0 ? "new" : "")}
                  typed={{ email: fields.newClientEmail.initialValue, phone: fields.newClientPhone.initialValue, address: fields.newClientAddress.initialValue }}
                  errors={{ email: fields.newClientEmail.errors, address: fields.newClientAddress.errors }}
                />
              ) : null}
            </fieldset>
            {balances.length === 0 ? (
              <div className="px-4.5 pb-4">
                <Caution>There is no balance in service. Register one under Instruments, or put one back in service; without a balance nothing is weighed, and nothing is taken in.</Caution>
              </div>
            ) : null}
            {items.map((item, index) => (
              <ItemFields
                key={item.key}
                fields={item.getFieldset() as unknown as ItemFieldset}
                position={index + 1}
                balances={balances}
                currency={laboratory.currency}
                remove={
                  items.length > 1 ? (
                    <button {...form.remove.getButtonProps({ name: fields.items.name, index })} className="cursor-pointer text-[13px] text-tint underline">
                      Remove item {index + 1}
                    </button>
                  ) : null
                }
              />
            ))}
            <div className="border-t border-rule px-4.5 py-4">
              {items.length < mostItems ? (
                <button {...form.insert.getButtonProps({ name: fields.items.name, defaultValue: emptyItem as ItemTyped })} className="min-h-9 cursor-pointer rounded-md border border-rule-2 bg-sheet px-3.5 py-1.5 font-semibold text-tint hover:bg-tint-bg">
                  Add another item
                </button>
              ) : null}
              <p className="mt-2 text-[12.5px] text-ink-3">One thing at a time, and one bag each. Photographs are added on the take-in's page, while the client is there.</p>
            </div>
            <fieldset className="border-t border-rule px-4.5 pt-4 pb-5">
              <legend className="sr-only">Statements and return</legend>
              <h2 className="mb-3 text-[18px]">Statements and return</h2>
              <div className="grid gap-3.5 sm:grid-cols-3">
                <TextAreaField key={fields.clientStatements.key} {...fieldProps(fields.clientStatements)} label="What the client states" isRequired={false} className="sm:col-span-3" rows={3} maxLength={4000} hint="In their words: names, origin, treatment, earlier reports. Marked as stated by the client wherever it is shown." />
                <SelectField
                  key={fields.returnMethod.key}
                  {...fieldProps(fields.returnMethod)}
                  label="The goods go back"
                  options={[
                    { value: "collect", label: "Collected here" },
                    { value: "courier", label: "By courier" },
                  ]}
                />
                <TextField key={fields.dueOn.key} {...fieldProps(fields.dueOn)} label="Due" type="date" min={today} hint={`Usually ${formatWeekdayDate(dueOn)}.`} />
                <TextField key={fields.place.key} {...fieldProps(fields.place)} label="Put in" autoComplete="off" maxLength={120} />
              </div>
            </fieldset>
          </Card>
          <div className="grid content-start gap-5">
            <HeldCard {...standing} addedMinor={addedMinor} currency={laboratory.currency} />
            <FeeCard prices={prices} services={servicesOf({ isSolePractice: laboratory.isSolePractice, isValuationWanted })} stoneCount={stoneCount} {...laboratory}>
              <div className="grid gap-3">
                <CheckboxField key={fields.isValuationWanted.key} {...checkboxProps(fields.isValuationWanted)} label="A valuation is wanted too" />
                <CheckboxField key={fields.isFeeAgreed.key} {...checkboxProps(fields.isFeeAgreed)} label="The client agrees to this fee" />
                {isOwner || fields.limitOverrideNote.errors ? (
                  fields.limitOverrideNote.errors || (standing.limitMinor !== null && standing.heldMinor + addedMinor > standing.limitMinor) ? (
                    <TextAreaField key={fields.limitOverrideNote.key} {...fieldProps(fields.limitOverrideNote)} label="Why above the limit" isRequired={false} rows={3} maxLength={500} />
                  ) : null
                ) : null}
                <Button disabled={isTakingIn}>Take in</Button>
                <p className="text-center text-[12.5px] text-ink-3">The fee never depends on what the stone turns out to be.</p>
              </div>
            </FeeCard>
          </div>
        </div>
      </Form>
    </>
  );
}

function stonesOf(item: Partial<ItemTyped> | undefined): number {
  const stoneCount = Number(item?.stoneCount ?? 1);
  return Number.isInteger(stoneCount) && stoneCount > 0 && stoneCount <= 100_000 ? examinedCount({ mount: (item?.mount ?? "loose") as MountState, stoneCount }) : 0;
}

/** Asks before a page with something typed is left by closing or reloading it. */
function useWarnBeforeLeaving(isDirty: boolean): void {
  const [isSending, setIsSending] = useState(false);
  useEffect(() => {
    if (!isDirty || isSending) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    const sending = () => setIsSending(true);
    window.addEventListener("beforeunload", warn);
    document.addEventListener("submit", sending);
    return () => {
      window.removeEventListener("beforeunload", warn);
      document.removeEventListener("submit", sending);
    };
  }, [isDirty, isSending]);
}

