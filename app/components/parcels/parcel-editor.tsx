import { startTransition, useMemo, useState, type ClipboardEvent, type FormEvent, type KeyboardEvent } from "react";
import { Form, useNavigation } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";
import { mostParcelRows, mostParcelText, parcelColumnNames, type ParcelColumn } from "#app/domain/parcel.ts";
import { judgeParcel } from "#app/features/parcels/judge-parcel.ts";
import { readPasted, type ParcelDraft, type ParcelProblems } from "#app/features/parcels/parcel-draft.ts";
import { readDraft } from "#app/features/parcels/read-draft.ts";
import { rowEvidence, type ReadRow } from "#app/features/parcels/row-evidence.ts";
import { ParcelHead, ParcelRow } from "./parcel-rows.tsx";
import { HowApart, ParcelSummary } from "./parcel-summary.tsx";
import { useRankedRows } from "./use-ranked-rows.ts";

type ParcelEditorProps = { draft: ParcelDraft; /** As the server found them when the form came back. */ problems: ParcelProblems; notes: readonly string[]; tableVersion: string };

/**
 * The table of a parcel: pasted, its columns recognised, every cell to be mended in place, ranked as it stands. All of
 * it works as a form that is sent, too.
 */
export function ParcelEditor({ draft, problems: sent, notes: notesSent, tableVersion }: ParcelEditorProps) {
  // A table that is pasted anew takes the place of the whole: its inputs are made anew by their key.
  const [table, setTable] = useState({ key: 0, columns: draft.columns, rows: draft.rows, notes: notesSent });
  const [waterTempC, setWaterTempC] = useState(draft.waterTempC);
  const navigation = useNavigation();
  const readRow = useMemo(() => onceARow([table.columns, waterTempC]), [table.columns, waterTempC]);
  const { rows: read, problems } = useMemo(() => readDraft({ ...draft, name: "named", waterTempC, columns: table.columns, rows: table.rows }, readRow), [draft, waterTempC, table, readRow]);
  const { ranked, isBusy } = useRankedRows(read, tableVersion);
  const judged = useMemo(() => judgeParcel(read, ranked.map((row) => row ?? null)), [read, ranked]);
  const [widths, setWidths] = useState(() => widthsOf(draft.rows));
  const cellProblems = Object.entries(problems.cells);
  const cellsOf = useMemo(() => byRow(problems.cells), [problems]);

  function takePasted(text: string) {
    if (!/[\t;,\n]/.test(text.trim())) return false;
    const { columns, rows, notes } = readPasted(text);
    if (rows.length === 0) return false;
    setTable(({ key }) => ({ key: key + 1, columns, rows, notes }));
    setWidths(widthsOf(rows));
    return true;
  }

  function onPaste(event: ClipboardEvent<HTMLTextAreaElement>) {
    takePasted(event.clipboardData.getData("text/plain"));
  }

  function onType({ target }: FormEvent<HTMLElement>) {
    if (!(target instanceof HTMLInputElement) || target.dataset.row === undefined) return;
    const [row, column, typed] = [Number(target.dataset.row), Number(target.dataset.column), target.value];
    // The input has its text already: what follows from it may come when there is time.
    startTransition(() => setTable((before) => ({ ...before, rows: before.rows.map((cells, at) => (at === row ? cells.map((cell, index) => (index === column ? typed : cell)) : cells)) })));
  }

  function onColumn(at: number, column: ParcelColumn | null) {
    setTable((before) => ({ ...before, columns: before.columns.map((each, index) => (index === at ? column : each)) }));
  }

  const hasTable = table.rows.length > 0;
  return (
    <Form method="post" className="grid gap-5">
      <input type="hidden" name="requestId" value={draft.requestId} />
      <Card>
        <CardBody className="grid gap-4 sm:grid-cols-3">
          <TextField id="parcel-name" name="name" label="Name" defaultValue={draft.name} errors={listOf(sent.fields.name)} maxLength={120} autoComplete="off" hint="As on its paper: “Lot 12, pink rounds”." />
          <TextField id="parcel-item" name="itemNumber" label="Item" defaultValue={draft.itemNumber} errors={listOf(sent.fields.itemNumber)} isRequired={false} isMono maxLength={24} autoComplete="off" hint="Its number on the receipt; rows can then become stones of it." />
          <TextField
            id="parcel-temp"
            name="waterTempC"
            label="Water’s temperature"
            unit="°C"
            defaultValue={draft.waterTempC}
            onChange={(event) => setWaterTempC(event.target.value)}
            errors={listOf(problems.fields.waterTempC ?? sent.fields.waterTempC)}
            isRequired={false}
            isMono
            inputMode="decimal"
            maxLength={24}
            hint="Where they were weighed in water."
          />
        </CardBody>
      </Card>
      <Card title={hasTable ? "Another table in its place" : "Paste the table"} note={`a row a stone, at most ${mostParcelRows}`}>
        <CardBody className="grid gap-3">
          <FormAlert errors={listOf(sent.fields.table)} />
          <TextAreaField
            id="parcel-pasted"
            name="pasted"
            label="From a spreadsheet"
            isRequired={false}
            rows={hasTable ? 2 : 6}
            maxLength={mostParcelText}
            spellCheck={false}
            onPaste={onPaste}
            hint="Separated by tabs, semicolons or commas; a first row that names the columns is recognised: mark, weight, RI low, RI high, density, colour."
          />
          {table.notes.map((note) => (
            <p key={note} className="text-sm text-straw">
              {note}
            </p>
          ))}
          <div className="flex flex-wrap gap-2.5">
            <Button look={hasTable ? "quiet" : "primary"} name="intent" value="read">
              Read the table
            </Button>
            <Button look="quiet" name="intent" value="addRow">
              Add an empty row
            </Button>
          </div>
        </CardBody>
      </Card>
      {hasTable ? (
        <Card title="The parcel" note="every cell as it was typed; mend it here">
          <CardBody className="grid gap-3">
            <ParcelSummary main={judged.main} rowCount={table.rows.length} oddRows={judged.rows.flatMap(({ odd }, at) => (odd.length > 0 ? [at + 1] : []))} isBusy={isBusy} />
            <CellProblems problems={cellProblems} columns={table.columns} />
          </CardBody>
          <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Table of the parcel" onInput={onType} onKeyDown={moveByKeys}>
            <table key={table.key} className="w-full border-collapse text-left">
              <caption className="sr-only">Stones of the parcel, one a row</caption>
              <ParcelHead columns={table.columns} problems={problems.columns} onColumn={onColumn} />
              <tbody>
                {table.rows.map((cells, at) => (
                  <ParcelRow key={at} at={at} columns={table.columns} cells={cells} widths={widths} problems={cellsOf.get(at) ?? {}} ranking={ranked[at] === undefined ? undefined : judged.rows[at]} />
                ))}
              </tbody>
            </table>
          </div>
          <CardBody className="grid gap-3">
            <HowApart />
            <div>
              <Button name="intent" value="save" busyLabel={navigation.state === "submitting" && navigation.formData?.get("intent") === "save" && "Saving"}>
                Save the parcel
              </Button>
            </div>
          </CardBody>
        </Card>
      ) : null}
    </Form>
  );
}

/** Reads a row once for as long as it is the same one, under the same columns: a key pressed reads one row anew, not all. */
function onceARow(_under: readonly unknown[]): typeof rowEvidence {
  const known = new WeakMap<readonly string[], ReadRow>();
  return (cells, setting) => {
    const read = known.get(cells) ?? rowEvidence(cells, setting);
    known.set(cells, read);
    return read;
  };
}

function CellProblems({ problems, columns }: { problems: ReadonlyArray<readonly [string, string]>; columns: ReadonlyArray<ParcelColumn | null> }) {
  if (problems.length === 0) return null;
  return (
    <div role="alert" className="rounded-md border border-red bg-red-bg px-3.5 py-2.5 text-sm text-red">
      <p className="font-medium">
        {problems.length} {problems.length === 1 ? "cell" : "cells"} cannot be read; nothing is saved before they are mended.
      </p>
      <ul className="mt-1 grid gap-0.5">
        {problems.slice(0, 12).map(([place, message]) => {
          const [row, column] = place.split(",").map(Number) as [number, number];
          const name = columns[column];
          return (
            <li key={place}>
              <a href={`#cell-${row}-${column}`} className="underline">
                Row {row + 1}, {name ? parcelColumnNames[name] : `column ${column + 1}`}
              </a>
              : {message}
            </li>
          );
        })}
        {problems.length > 12 ? <li>and {problems.length - 12} more</li> : null}
      </ul>
    </div>
  );
}

/** Enter and the arrows go up and down a column, as in the table that it came from. */
function moveByKeys(event: KeyboardEvent<HTMLElement>) {
  const { target, key, shiftKey } = event;
  if (!(target instanceof HTMLInputElement) || target.dataset.row === undefined) return;
  const step = key === "ArrowDown" || (key === "Enter" && !shiftKey) ? 1 : key === "ArrowUp" || key === "Enter" ? -1 : 0;
  if (step === 0) return;
  event.preventDefault();
  const next = document.getElementById(`cell-${Number(target.dataset.row) + step}-${target.dataset.column}`);
  if (next instanceof HTMLInputElement) {
    next.focus();
    next.select();
  }
}

function byRow(cells: Readonly<Record<string, string>>): Map<number, Record<number, string>> {
  const rows = new Map<number, Record<number, string>>();
  for (const [place, message] of Object.entries(cells)) {
    const [row, column] = place.split(",").map(Number) as [number, number];
    rows.set(row, { ...rows.get(row), [column]: message });
  }
  return rows;
}

const widthsOf = (rows: readonly string[][]) => (rows[0] ?? []).map((_, at) => rows.reduce((most, row) => Math.max(most, row[at]?.length ?? 0), 0));

const listOf = (message: string | undefined) => (message ? [message] : undefined);
