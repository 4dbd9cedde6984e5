import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, Link, redirect } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { RanksAs } from "#app/components/parcels/parcel-rows.tsx";
import { HowApart, ParcelSummary } from "#app/components/parcels/parcel-summary.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { FieldNotes } from "#app/components/ui/field-frame.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { parcelColumnNames, type ParcelColumn } from "#app/domain/parcel.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { lightNames, lights, spotMethodNames, spotMethods } from "#app/domain/reading.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { formatStoneCode } from "#app/domain/take-in.ts";
import { listInstruments } from "#app/features/instruments/list-instruments.server.ts";
import { getParcel } from "#app/features/parcels/get-parcel.server.ts";
import { nameParcelItem } from "#app/features/parcels/name-parcel-item.server.ts";
import { openParcelStone } from "#app/features/parcels/open-parcel-stone.server.ts";
import { parcelItemForm, parcelStoneForm } from "#app/features/parcels/parcel-stone-form.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/detail";

function parcelIdOf(ref: string) {
  const id = idFromShortRef<"parcel">(ref);
  if (!id) throw data({ userMessage: "There is no such parcel." }, { status: 404 });
  return id;
}

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const [parcel, instruments] = await orResponse(Promise.all([getParcel(ctx, parcelIdOf(params.parcelRef)), listInstruments(ctx)]));
  return {
    parcel,
    instruments: instruments.filter(({ status }) => status !== "outOfService").map(({ ref, kind, name, description, outOfCheck }) => ({ ref, kind, label: `${name}${description ? `, ${description}` : ""}${outOfCheck ? " (out of check)" : ""}` })),
    timeZone: ctx.laboratory.timeZone,
    canOpen: isAllowed(ctx.roles, "readings.record"),
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "readings.record");
  const id = parcelIdOf(params.parcelRef);
  const formData = await request.formData();
  const intent = formData.get("intent") === "item" ? ("item" as const) : ("stone" as const);
  const answer = ({ data: { result }, init }: ReturnType<typeof formInvalid>) => data({ intent, result }, init ?? {});
  if (intent === "item") {
    const submission = parseWithZod(formData, { schema: parcelItemForm });
    if (submission.status !== "success") return answer(formInvalid(submission));
    try {
      await nameParcelItem(ctx, id, submission.value);
      return redirect(`/lab/${params.labSlug}/parcels/${params.parcelRef}`, { headers: { "Set-Cookie": await noticeHeader("The parcel belongs to its item. Its rows can become stones now.") } });
    } catch (error) {
      return answer(formRefused(submission, error));
    }
  }
  const submission = parseWithZod(formData, { schema: parcelStoneForm });
  if (submission.status !== "success") return answer(formInvalid(submission));
  const { refractometer, balance, polariscope, ...how } = submission.value;
  try {
    const { stoneCode, isAdded } = await openParcelStone(ctx, id, { ...how, refractometerId: refractometer, balanceId: balance, polariscopeId: polariscope });
    const more = isAdded ? " The item had no stone left without readings, so a further one was opened: tell the desk, if it bears a fee." : "";
    return redirect(`/lab/${params.labSlug}/stones/${stoneCode}`, { headers: { "Set-Cookie": await noticeHeader(`Row ${how.position} is ${formatStoneCode(stoneCode)}, with its readings.${more}`) } });
  } catch (error) {
    return answer(formRefused(submission, error));
  }
}

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: `${(loaderData as { parcel?: { name: string } } | undefined)?.parcel?.name ?? "Parcel"} · Isogyre` }];

export default function ParcelRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { parcel, timeZone, canOpen } = loaderData;
  const lab = `/lab/${params.labSlug}`;
  const oddRows = parcel.rows.flatMap(({ position, ranking }) => (ranking.odd.length > 0 ? [position] : []));
  const mainCount = parcel.rows.filter(({ ranking }) => ranking.top[0]?.speciesId === parcel.mainSpeciesId).length;
  const resultOf = (intent: string) => (actionData?.intent === intent ? actionData.result : undefined);
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={`${lab}/parcels`} className="text-ink-3">
            Parcels
          </Link>
        }
        title={parcel.name}
        note={
          <>
            {parcel.rowCount} stones, saved {formatInstant(parcel.savedAt, timeZone)} by {parcel.savedBy}
            {parcel.item ? (
              <>
                , item{" "}
                <Link to={`${lab}/take-ins/${parcel.item.takeInNumber}`} className="font-mono text-ink-2">
                  {parcel.item.number}
                </Link>
              </>
            ) : null}
          </>
        }
        actions={canOpen ? <LinkButton to={`${lab}/parcels/new?from=${parcel.ref}`}>Copy into a new table</LinkButton> : null}
      />
      <div className="grid gap-5">
        <Card title="Together">
          <CardBody className="grid gap-3">
            <ParcelSummary main={parcel.mainSpeciesId ? { speciesId: parcel.mainSpeciesId, name: parcel.mainName, rowCount: mainCount } : null} rowCount={parcel.rowCount} oddRows={oddRows} />
            {oddRows.length > 0 ? (
              <ul className="grid gap-1 text-sm">
                {parcel.rows.filter(({ ranking }) => ranking.odd.length > 0).map(({ position, ranking }) => (
                  <li key={position}>
                    <a href={`#row-${position}`} className="font-medium text-link">
                      Row {position}
                    </a>
                    : {ranking.odd.join(" ")}
                  </li>
                ))}
              </ul>
            ) : null}
            <HowApart />
            <p className="text-xs text-ink-3">
              Ranked when it was saved, with species table {parcel.speciesTableVersion}, model {parcel.modelVersion}. A ranking proposes; a person concludes, stone by stone.
            </p>
          </CardBody>
        </Card>
        {canOpen && !parcel.item ? <NameItem lastResult={resultOf("item")} /> : null}
        {canOpen && parcel.item ? <OpenStones {...loaderData} lab={lab} lastResult={resultOf("stone")} /> : (
          <Card title="Rows">
            <Rows parcel={parcel} lab={lab} canOpen={false} />
          </Card>
        )}
      </div>
    </>
  );
}

type LoaderData = Route.ComponentProps["loaderData"];

function NameItem({ lastResult }: { lastResult: SubmissionResult<string[]> | undefined }) {
  const [form, fields] = useForm<{ itemNumber: string }>({ id: "parcel-item", lastResult });
  return (
    <Card title="Which item is it?">
      <CardBody>
        <Form method="post" {...getFormProps(form)} className="flex flex-wrap items-start gap-3">
          <input type="hidden" name="intent" value="item" />
          <TextField key={fields.itemNumber.key} {...fieldProps(fields.itemNumber)} label="Item" isMono maxLength={24} autoComplete="off" hint="Its number on the receipt. Rows become stones of it; this is said once." />
          <div className="pt-5">
            <Button look="quiet">It is this item</Button>
          </div>
        </Form>
        <FormAlert errors={form.errors} id={form.errorId} />
      </CardBody>
    </Card>
  );
}

function OpenStones({ parcel, instruments, lab, lastResult }: LoaderData & { lab: string; lastResult: SubmissionResult<string[]> | undefined }) {
  const [form, fields] = useForm<Record<"position" | "refractometer" | "balance" | "polariscope" | "light" | "spotMethod" | "directionsTried", string>>({ id: "open-stone", lastResult, defaultValue: { light: "sodium", spotMethod: "50/50" } });
  const has = (...columns: ParcelColumn[]) => columns.some((column) => parcel.columns.includes(column));
  const of = (kind: string) => instruments.filter((instrument) => instrument.kind === kind).map(({ ref, label }) => ({ value: ref, label }));
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      <input type="hidden" name="intent" value="stone" />
      <Card title="A row becomes a stone" note="with its figures as readings, on these instruments">
        <CardBody className="grid gap-3.5">
          <FormAlert errors={form.errors} id={form.errorId} />
          <FieldNotes id={fields.position.id} errors={fields.position.errors} />
          <div className="grid gap-3.5 sm:grid-cols-2 lg:grid-cols-4">
            {has("weightCt", "waterCt") ? <SelectField key={fields.balance.key} {...fieldProps(fields.balance)} label="Weighed on" emptyLabel="Choose" options={of("balance")} /> : null}
            {has("riLow", "riHigh", "riSpot") ? <SelectField key={fields.refractometer.key} {...fieldProps(fields.refractometer)} label="Indices read on" emptyLabel="Choose" options={of("refractometer")} /> : null}
            {has("riLow", "riHigh", "riSpot") ? <SelectField key={fields.light.key} {...fieldProps(fields.light)} label="Light" options={lights.map((value) => ({ value, label: lightNames[value] }))} /> : null}
            {has("riSpot") ? <SelectField key={fields.spotMethod.key} {...fieldProps(fields.spotMethod)} label="Spots read by" options={spotMethods.map((value) => ({ value, label: spotMethodNames[value] }))} /> : null}
            {has("character") ? <SelectField key={fields.polariscope.key} {...fieldProps(fields.polariscope)} label="Polariscope" isRequired={false} emptyLabel="Not said" options={of("polariscope")} /> : null}
            {has("character") ? <TextField key={fields.directionsTried.key} {...fieldProps(fields.directionsTried)} label="Directions each was turned in" isRequired={false} inputMode="numeric" maxLength={2} hint="Left empty, the character is kept in words." /> : null}
          </div>
          <p className="text-xs text-ink-3">It takes the stone of {parcel.item?.number} whose number is the row’s mark, else the next one without readings. Each reading names this parcel and the row.</p>
        </CardBody>
      </Card>
      <Card title="Rows">
        <Rows parcel={parcel} lab={lab} canOpen />
      </Card>
    </Form>
  );
}

function Rows({ parcel: { columns, rows }, lab, canOpen }: { parcel: LoaderData["parcel"]; lab: string; canOpen: boolean }) {
  return (
    <Table caption="Rows of the parcel, as typed">
      <thead>
        <tr>
          <HeaderCell>Row</HeaderCell>
          {columns.map((column, at) => (
            <HeaderCell key={at}>{column ? parcelColumnNames[column] : "Left out"}</HeaderCell>
          ))}
          <HeaderCell>Ranks as</HeaderCell>
          <HeaderCell>Stone</HeaderCell>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ position, cells, ranking, stoneCode }) => (
          <tr key={position} id={`row-${position}`} className={ranking.odd.length > 0 ? "bg-straw-bg/60" : ""}>
            <Cell className="text-right font-mono text-xs text-ink-3">{position}</Cell>
            {columns.map((column, at) => (
              <Cell key={at} className={`font-mono ${column === null ? "text-ink-3" : ""} ${(cells[at]?.length ?? 0) <= 24 ? "whitespace-nowrap" : ""}`}>
                {cells[at]}
              </Cell>
            ))}
            <Cell className="min-w-44">
              <RanksAs ranking={ranking} />
            </Cell>
            <Cell className="whitespace-nowrap">
              {stoneCode ? (
                <Link to={`${lab}/stones/${stoneCode}`} className="font-mono text-tint">
                  {formatStoneCode(stoneCode)}
                </Link>
              ) : canOpen ? (
                <Button look="quiet" size="small" name="position" value={position} aria-label={`Make row ${position} a stone`}>
                  Make it a stone
                </Button>
              ) : null}
            </Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
