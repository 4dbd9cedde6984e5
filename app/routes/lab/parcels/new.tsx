import { data, Link, redirect } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { ParcelEditor } from "#app/components/parcels/parcel-editor.tsx";
import { AppError } from "#app/domain/app-error.ts";
import { mostParcelRows } from "#app/domain/parcel.ts";
import { idFromShortRef, shortRef } from "#app/domain/short-ref.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { getParcel } from "#app/features/parcels/get-parcel.server.ts";
import { noProblems, parcelDraftFromForm, readPasted, type ParcelDraft, type ParcelProblems } from "#app/features/parcels/parcel-draft.ts";
import { saveParcel } from "#app/features/parcels/save-parcel.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/new";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  await orResponse((async () => requireRole(ctx, "readings.record"))());
  const empty: ParcelDraft = { requestId: newRequestId(), name: "", itemNumber: url.searchParams.get("item")?.slice(0, 24) ?? "", waterTempC: "", columns: [], rows: [] };
  const from = idFromShortRef<"parcel">(url.searchParams.get("from") ?? "");
  const { table } = loadSpeciesTable();
  if (!from) return { draft: empty, tableVersion: table.version };
  const copied = await orResponse(getParcel(ctx, from));
  const draft: ParcelDraft = { ...empty, name: copied.name, itemNumber: copied.item?.number ?? "", waterTempC: copied.waterTempC === null ? "" : String(copied.waterTempC), columns: copied.columns, rows: copied.rows.map(({ cells }) => cells) };
  return { draft, tableVersion: table.version };
}

type Answer = { draft: ParcelDraft; problems: ParcelProblems; notes: readonly string[]; /** Told apart from the answer before it. */ mark: string };

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "readings.record");
  const formData = await request.formData();
  const draft = parcelDraftFromForm(formData);
  const intent = formData.get("intent");
  const answer = (changed: Partial<Answer>, status = 200) => data<Answer>({ draft, problems: noProblems, notes: [], mark: newRequestId(), ...changed }, { status });
  const pasted = String(formData.get("pasted") ?? "");
  if (intent === "addRow") return answer({ draft: withEmptyRow(draft) });
  if (intent === "read" || (draft.rows.length === 0 && pasted.trim() !== "")) {
    if (pasted.trim() === "") return answer(draft.rows.length > 0 ? {} : { problems: { ...noProblems, fields: { table: "Paste a table with a row for each stone." } } }, draft.rows.length > 0 ? 200 : 400);
    const { columns, rows, notes } = readPasted(pasted);
    if (rows.length === 0) return answer({ problems: { ...noProblems, fields: { table: "There is no row of a stone in this." } } }, 400);
    return answer({ draft: { ...draft, columns, rows }, notes });
  }
  try {
    const { parcelId, problems } = await saveParcel(ctx, draft);
    if (!parcelId) return answer({ problems }, 400);
    return redirect(`/lab/${params.labSlug}/parcels/${shortRef(parcelId)}`, { headers: { "Set-Cookie": await noticeHeader(`The parcel is saved: ${draft.rows.length} rows.`) } });
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    return answer({ problems: { ...noProblems, fields: { table: error.userMessage } } }, error.status);
  }
}

/** A first row comes with the columns that most tables have. */
function withEmptyRow(draft: ParcelDraft): ParcelDraft {
  const columns = draft.columns.length > 0 ? draft.columns : (["mark", "weightCt", "riLow", "riHigh", "sg", "colour"] as const);
  // One that is not quite empty: empty rows are left out when the form is read.
  const row = columns.map((column) => (column === "mark" ? String(draft.rows.length + 1) : ""));
  return { ...draft, columns, rows: [...draft.rows, row].slice(0, mostParcelRows) };
}

export const meta: Route.MetaFunction = () => [{ title: "New parcel · Isogyre" }];

export default function NewParcelRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const draft = actionData?.draft ?? loaderData.draft;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={`/lab/${params.labSlug}/parcels`} className="text-ink-3">
            Parcels
          </Link>
        }
        title="A parcel as a table"
        note="Many small stones read together, one a row, ranked as they stand."
      />
      <ParcelEditor key={actionData?.mark ?? draft.requestId} draft={draft} problems={actionData?.problems ?? noProblems} notes={actionData?.notes ?? []} tableVersion={loaderData.tableVersion} />
    </>
  );
}

