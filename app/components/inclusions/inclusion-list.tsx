import { Form } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { Confirm } from "#app/components/ui/confirm.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { inclusionName } from "#app/domain/inclusion.ts";
import type { PlottedInclusion } from "#app/features/inclusions/get-inclusions.server.ts";
import { howWords, whereWords } from "./inclusion-words.ts";

export type ListedInclusion = Omit<PlottedInclusion, "recordedAt" | "strike"> & { when: string; strike: { when: string; by: string; reason: string } | null };
type InclusionListProps = { inclusions: readonly ListedInclusion[]; photoNumber: (ref: string) => number; canStrike: (inclusion: ListedInclusion) => boolean; reason?: { sequence: string; value: string; errors: string[] } };

/** Every inclusion in words, struck ones in their places. */
export function InclusionList({ inclusions, photoNumber, canStrike, reason }: InclusionListProps) {
  return (
    <Table caption="Inclusions">
      <thead>
        <tr>
          <HeaderCell isNumber>No.</HeaderCell>
          <HeaderCell>What</HeaderCell>
          <HeaderCell>Where</HeaderCell>
          <HeaderCell>How deep, how large</HeaderCell>
          <HeaderCell hideBelow="md">By</HeaderCell>
          <HeaderCell>
            <span className="sr-only">Strike</span>
          </HeaderCell>
        </tr>
      </thead>
      <tbody>
        {inclusions.map((inclusion) => {
          const { sequence, strike, note, observer, when } = inclusion;
          const isStruck = strike !== null;
          return (
            <tr key={sequence}>
              <Cell isNumber isStruck={isStruck}>
                {sequence}
              </Cell>
              <Cell isStruck={isStruck}>
                {inclusionName(inclusion)}
                {note ? <span className="block text-sm text-ink-2">{note}</span> : null}
              </Cell>
              <Cell isStruck={isStruck}>{whereWords(inclusion, photoNumber)}</Cell>
              <Cell isStruck={isStruck}>{howWords(inclusion)}</Cell>
              <Cell hideBelow="md">
                <span className="text-sm text-ink-2">
                  {observer}, {when}
                </span>
              </Cell>
              <Cell>
                {strike ? (
                  <span className="text-sm text-red">
                    Struck {strike.when} by {strike.by}: {strike.reason}
                  </span>
                ) : canStrike(inclusion) ? (
                  <Confirm summary={`Strike no. ${sequence}`}>
                    <Form method="post" preventScrollReset className="grid min-w-56 gap-2.5">
                      <input type="hidden" name="intent" value="strike" />
                      <input type="hidden" name="sequence" value={sequence} />
                      <TextField id={`strike-${sequence}`} name="reason" label="Why it is struck" maxLength={500} defaultValue={reason?.sequence === String(sequence) ? reason.value : undefined} errors={reason?.sequence === String(sequence) ? reason.errors : undefined} />
                      <div>
                        <Button look="danger" size="small">
                          Strike
                        </Button>
                      </div>
                    </Form>
                  </Confirm>
                ) : null}
              </Cell>
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}
