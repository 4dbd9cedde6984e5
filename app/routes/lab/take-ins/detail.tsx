import type { SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, Link, redirect } from "react-router";
import { HandOverForm, ReleaseForm } from "#app/components/take-in/hand-over-form.tsx";
import { PhotoUpload, type SendPhotos } from "#app/components/take-in/photo-upload.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { Cell, HeaderCell, RowHeaderCell, Table } from "#app/components/ui/table.tsx";
import { AppError } from "#app/domain/app-error.ts";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { consentQuestions } from "#app/domain/consent.ts";
import { invoiceStateNames } from "#app/domain/invoice-state.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import { money } from "#app/domain/money/money.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { examinationStateNames, goodsStateNames } from "#app/domain/stone-state.ts";
import { capacityNames, formatStoneCode, serviceNames } from "#app/domain/take-in.ts";
import { formatWeekdayDate } from "#app/domain/working-days.ts";
import { handOverForm, releaseForm } from "#app/features/custody/custody-forms.server.ts";
import { custodyPurposeNames } from "#app/features/custody/custody-purpose-names.ts";
import { listHolders } from "#app/features/custody/list-holders.server.ts";
import { recordHandOver } from "#app/features/custody/record-hand-over.server.ts";
import { releaseItem } from "#app/features/custody/release-item.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { addPhoto } from "#app/features/photos/add-photo.server.ts";
import { findItemForPhoto } from "#app/features/photos/find-item-for-photo.server.ts";
import { removePhoto } from "#app/features/photos/remove-photo.server.ts";
import { getTakeIn } from "#app/features/take-ins/get-take-in.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { UploadRouter } from "#app/web/upload-router.server.ts";
import type { Route } from "./+types/detail";

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const [takeIn, holders] = await orResponse(Promise.all([getTakeIn(ctx, params.number), listHolders(ctx)]));
  return {
    takeIn: { ...takeIn, items: takeIn.items.map((item) => ({ ...item, requestIds: { photo: newRequestId(), handOver: newRequestId(), release: newRequestId() } })) },
    holders,
    timeZone: ctx.laboratory.timeZone,
    can: { move: isAllowed(ctx.roles, "custody.record"), release: isAllowed(ctx.roles, "custody.release"), photograph: isAllowed(ctx.roles, "photos.add"), readParcels: isAllowed(ctx.roles, "readings.read"), seesDeclared: isAllowed(ctx.roles, "declaredValue.read") },
  };
}

/** Which of the page's forms an answer is for. */
type Answer = { itemNumber: string; intent: string; result?: SubmissionResult<string[]>; problems?: string[] };

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "photos.add");
  const formData = await request.formData();
  const intent = String(formData.get("intent") ?? "");
  const itemNumber = String(formData.get("itemNumber") ?? "");
  const here = `/lab/${params.labSlug}/take-ins/${params.number}`;
  const done = async (text: string) => redirect(here, { headers: { "Set-Cookie": await noticeHeader(text) } });
  const answer = ({ data: { result }, init }: ReturnType<typeof formInvalid>) => data<Answer>({ itemNumber, intent, result }, init ?? {});

  if (intent === "handOver") {
    const submission = parseWithZod(formData, { schema: handOverForm });
    if (submission.status !== "success") return answer(formInvalid(submission));
    try {
      await recordHandOver(ctx, submission.value);
    } catch (error) {
      return answer(formRefused(submission, error));
    }
    return done(`The hand-over of ${itemNumber} is recorded.`);
  }
  if (intent === "release") {
    const submission = parseWithZod(formData, { schema: releaseForm });
    if (submission.status !== "success") return answer(formInvalid(submission));
    try {
      await releaseItem(ctx, submission.value);
    } catch (error) {
      return answer(formRefused(submission, error));
    }
    return done(`${itemNumber} is released.`);
  }
  if (intent === "photo") {
    const { added, problems, status } = await keepPhotos(ctx, formData, itemNumber);
    if (problems.length > 0) return data<Answer>({ itemNumber, intent, problems }, { status });
    return done(added === 1 ? "The photograph is kept." : `${added} photographs are kept.`);
  }
  if (intent === "removePhoto") {
    const photoId = idFromShortRef<"attachment">(String(formData.get("photo") ?? ""));
    try {
      if (!photoId) throw new AppError("not_found", "There is no such photograph.");
      await removePhoto(ctx, photoId);
    } catch (error) {
      if (!(error instanceof AppError)) throw error;
      return data<Answer>({ itemNumber, intent, problems: [error.userMessage] }, { status: error.status });
    }
    return done("The photograph is removed.");
  }
  throw data({ userMessage: "This form is not known here. Open the page anew." }, { status: 400 });
}

/** Photographs from the form without script; the ones before a wrong one are kept, and it says which was wrong. */
async function keepPhotos(ctx: LabContext, formData: FormData, itemNumber: string) {
  const files = formData.getAll("photo").filter((entry): entry is File => typeof entry !== "string" && entry.size > 0);
  const requestId = String(formData.get("requestId") ?? "");
  if (files.length === 0) return { added: 0, problems: ["Choose a photograph first."], status: 400 };
  if (!/^[0-9a-f-]{36}$/.test(requestId)) return { added: 0, problems: ["This form is not complete. Open the page anew and send it again."], status: 400 };
  const problems: string[] = [];
  let added = 0;
  let status = 200;
  for (const [index, file] of files.entries()) {
    try {
      const itemId = await findItemForPhoto(ctx, itemNumber);
      await addPhoto(ctx, { itemId, bytes: Buffer.from(await file.arrayBuffer()), fileName: file.name, sourceKey: `form:${requestId}:${index}` });
      added++;
    } catch (error) {
      if (!(error instanceof AppError)) throw error;
      status = error.status;
      problems.push(files.length === 1 ? error.userMessage : `${file.name}: ${error.userMessage}`);
    }
  }
  return { added, problems, status };
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `${params.number} · Isogyre` }];

export default function TakeInDetailRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { takeIn, holders, timeZone, can } = loaderData;
  const base = `/lab/${params.labSlug}`;
  const answerTo = (itemNumber: string, intent: string) => (actionData && "itemNumber" in actionData && actionData.itemNumber === itemNumber && actionData.intent === intent ? (actionData as Answer) : undefined);
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={`${base}/stones`} className="text-ink-3">
            Logbook
          </Link>
        }
        title={<span className="font-mono text-[24px]">{takeIn.number}</span>}
        note={
          <>
            <Link to={`${base}/clients/${takeIn.client.ref}`} className="text-ink-2">
              {takeIn.client.name}
            </Link>
            , received {formatInstant(takeIn.receivedAt, timeZone)} by {takeIn.receivedBy}
          </>
        }
        actions={
          <>
            <LinkButton to={`${base}/take-ins/${takeIn.number}/labels`}>Labels</LinkButton>
            <LinkButton look="primary" to={`${base}/take-ins/${takeIn.number}/receipt`}>
              Receipt
            </LinkButton>
          </>
        }
      />
      <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_22rem]">
        <div className="grid content-start gap-5">
          {takeIn.items.map((item) => (
            <Card
              key={item.number}
              id={`item-${item.number}`}
              title={item.description}
              note={<span className="font-mono">{item.number}</span>}
              aside={<Chip tone={item.goodsState === "released" ? "plain" : item.goodsState === "away" ? "straw" : "tint"}>{goodsStateNames[item.goodsState]}</Chip>}
            >
              <CardBody className="grid gap-4">
                <Facts
                  rows={[
                    { name: "Weight", value: `${item.massText} ${item.massUnit}`, isMono: true },
                    { name: "Balance", value: item.balance },
                    { name: "Stones", value: `${item.stoneCount}, ${item.mount}` },
                    { name: "Condition", value: item.condition },
                    { name: "Declared value", value: can.seesDeclared && item.declaredValueMinor !== null ? `${formatMoney(money(item.declaredValueMinor, item.declaredCurrency!))}, the client's figure, for custody only` : null },
                    { name: "Consents", value: consentQuestions.filter(({ code }) => item.consents.includes(code)).map(({ label }) => label).join(" · ") || "None given" },
                  ]}
                />
                <ul className="flex flex-wrap gap-3">
                  {item.photos.map((photo, index) => (
                    <li key={photo}>
                      <a href={`${base}/photos/${photo}`}>
                        <img src={`${base}/photos/${photo}/thumbnail`} alt={`Photograph ${index + 1} of ${item.number}`} width={96} height={96} className="size-24 rounded-md border border-rule object-cover" />
                      </a>
                      {can.photograph && item.stones.every((stone) => stone.examinationState === "received") ? (
                        <Form method="post" className="no-print text-center">
                          <input type="hidden" name="itemNumber" value={item.number} />
                          <input type="hidden" name="photo" value={photo} />
                          <button name="intent" value="removePhoto" className="cursor-pointer text-[12.5px] text-ink-3 underline" aria-label={`Remove photograph ${index + 1}`}>
                            Remove
                          </button>
                        </Form>
                      ) : null}
                    </li>
                  ))}
                </ul>
                <FormAlert errors={answerTo(item.number, "removePhoto")?.problems} />
                {can.photograph && item.goodsState !== "released" ? (
                  <PhotoUpload itemNumber={item.number} requestId={item.requestIds.photo} errors={answerTo(item.number, "photo")?.problems} send={(files, onProgress) => sendPhotos({ labSlug: params.labSlug, itemNumber: item.number }, files, onProgress)} />
                ) : null}
              </CardBody>
              <Table caption={`Stones of ${item.number}`}>
                <thead>
                  <tr>
                    <HeaderCell>Stone</HeaderCell>
                    <HeaderCell>Examination</HeaderCell>
                    <HeaderCell>Where</HeaderCell>
                  </tr>
                </thead>
                <tbody>
                  {item.stones.map((stone) => (
                    <tr key={stone.code}>
                      <RowHeaderCell isMono to={`${base}/stones/${stone.code}`}>
                        {formatStoneCode(stone.code)}
                      </RowHeaderCell>
                      <Cell>{examinationStateNames[stone.examinationState]}</Cell>
                      <Cell className="text-ink-2">{[stone.holder, stone.place].filter(Boolean).join(", ")}</Cell>
                    </tr>
                  ))}
                </tbody>
              </Table>
              {can.readParcels && item.mount === "loose" && item.stoneCount > 1 ? (
                <p className="no-print border-t border-rule px-4.5 py-2.5 text-sm">
                  <Link to={`${base}/parcels?item=${item.number}`} className="text-link">
                    Read its {item.stoneCount} stones as a parcel, in one table
                  </Link>
                </p>
              ) : null}
              <Custody events={item.custody} timeZone={timeZone} itemNumber={item.number} />
              {can.move && item.goodsState !== "released" ? (
                <Panel title="Hand it over" isOpen={answerTo(item.number, "handOver") !== undefined}>
                  <HandOverForm key={item.custody.length} itemNumber={item.number} requestId={item.requestIds.handOver} massUnit={item.massUnit} goodsState={item.goodsState} holders={holders} lastResult={answerTo(item.number, "handOver")?.result} />
                </Panel>
              ) : null}
              {can.release && item.goodsState === "safe" ? (
                <Panel title="Release it" isOpen={answerTo(item.number, "release") !== undefined}>
                  <ReleaseForm itemNumber={item.number} requestId={item.requestIds.release} massUnit={item.massUnit} lastResult={answerTo(item.number, "release")?.result} />
                </Panel>
              ) : null}
            </Card>
          ))}
        </div>
        <div className="grid content-start gap-5">
          <Card title="Agreed" id="agreed">
            <CardBody>
              <Facts
                rows={[
                  { name: "Handed over by", value: `${takeIn.handedOverBy} (${capacityNames[takeIn.capacity].toLowerCase()})` },
                  { name: "Services", value: takeIn.services.map((service) => serviceNames[service]).join(", ") },
                  { name: "Fee agreed", value: formatInstant(takeIn.feeAgreedAt, timeZone) },
                  { name: "Due", value: formatWeekdayDate(takeIn.dueOn) },
                  { name: "Goes back", value: takeIn.returnMethod === "collect" ? "Collected here" : "By courier" },
                ]}
              />
            </CardBody>
          </Card>
          {takeIn.invoice ? (
            <Card title="Invoice" id="invoice" aside={<Chip tone={takeIn.invoice.state === "paid" ? "green" : takeIn.invoice.state === "open" ? "straw" : "plain"}>{invoiceStateNames[takeIn.invoice.state]}</Chip>}>
              <CardBody>
                <Facts
                  rows={[
                    { name: "Number", value: <Link to={`${base}/invoices/${takeIn.invoice.number}`} className="text-tint">{takeIn.invoice.number}</Link>, isMono: true },
                    { name: "To pay", value: formatMoney(money(takeIn.invoice.totalMinor, takeIn.invoice.currency)), isMono: true },
                  ]}
                />
              </CardBody>
            </Card>
          ) : null}
          {takeIn.clientStatements ? (
            <Card title="As stated by the client" id="statements">
              <CardBody>
                <blockquote className="border-l-2 border-rule-2 pl-3 whitespace-pre-wrap text-ink-2">{takeIn.clientStatements}</blockquote>
              </CardBody>
            </Card>
          ) : null}
        </div>
      </div>
    </>
  );
}

function Panel({ title, isOpen, children }: { title: string; isOpen: boolean; children: React.ReactNode }) {
  return (
    <details open={isOpen} className="group no-print border-t border-rule px-4.5 py-3">
      <summary className="font-semibold text-tint">
        <span aria-hidden="true" className="mr-1.5 inline-block transition-transform group-open:rotate-90">
          ▸
        </span>
        {title}
      </summary>
      <div className="pt-3 pb-1">{children}</div>
    </details>
  );
}

type CustodyEvents = Route.ComponentProps["loaderData"]["takeIn"]["items"][number]["custody"];

function Custody({ events, timeZone, itemNumber }: { events: CustodyEvents; timeZone: string; itemNumber: string }) {
  return (
    <div className="border-t border-rule">
      <h3 className="px-4.5 pt-3 text-[16px]">Custody</h3>
      <Table caption={`Hand-overs of ${itemNumber}`}>
        <thead>
          <tr>
            <HeaderCell>When</HeaderCell>
            <HeaderCell>What</HeaderCell>
            <HeaderCell>To</HeaderCell>
            <HeaderCell isNumber>Weight</HeaderCell>
            <HeaderCell>By</HeaderCell>
          </tr>
        </thead>
        <tbody>
          {events.map((event) => (
            <tr key={event.sequence}>
              <Cell className="whitespace-nowrap">{formatInstant(event.at, timeZone)}</Cell>
              <Cell>
                {custodyPurposeNames[event.purpose]}
                {event.seal ? <span className="text-ink-3">, seal {event.seal}</span> : null}
                {event.remark ? <span className="block text-[12.5px] text-ink-3">{event.remark}</span> : null}
              </Cell>
              <Cell>{[event.holder, event.toPlace].filter(Boolean).join(", ")}</Cell>
              <Cell isNumber>{event.massText ? `${event.massText} ${event.massUnit}` : ""}</Cell>
              <Cell>{event.by}</Cell>
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}

// The file store's client comes when a photograph is sent, not with the page.
async function sendPhotos(input: { labSlug: string; itemNumber: string }, files: File[], onProgress: Parameters<SendPhotos>[1]): Promise<string[]> {
  const { genUploader } = await import("uploadthing/client");
  const { uploadFiles } = genUploader<UploadRouter>({ package: "isogyre" });
  const kept = await uploadFiles("photo", { files, input, onUploadProgress: ({ totalProgress }) => onProgress(Math.round(totalProgress)) });
  return kept.flatMap((file) => (file.serverData?.problem ? [`${file.name}: ${file.serverData.problem}`] : []));
}
