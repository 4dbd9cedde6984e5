import { Form, Link } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { CheckboxField } from "#app/components/ui/choice-field.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import type { BenchRanking } from "#app/features/identification/bench-ranking.ts";
import type { RankingView } from "#app/features/identification/readings-as-of.ts";
import { observationKindNames, type ObservationKind } from "#app/domain/reading.ts";

type Moment = Readonly<{ sequence: number; when: string; kind: ObservationKind }>;
type RankingViewFormProps = { test: ObservationKind; moments: readonly Moment[]; hasStruck: boolean; view: RankingView; comparable: BenchRanking["comparable"]; compare: readonly string[]; isOpen: boolean; prior: "prevalence" | "even" };

/** How else the ranking can be looked at: at an earlier moment, with what was struck, two candidates lane by lane. */
export function RankingViewForm({ test, moments, hasStruck, view, comparable, compare, isOpen, prior }: RankingViewFormProps) {
  const species = comparable.map(({ speciesId, name }) => ({ value: speciesId, label: name }));
  return (
    <details open={isOpen} className="no-print rounded-lg border border-rule bg-sheet px-4.5 py-2.5">
      <summary className="flex min-h-6 cursor-pointer items-center text-sm text-tint pointer-coarse:min-h-11">Compare two, look back, or weigh all alike</summary>
      <Form method="get" preventScrollReset className="mt-2 grid gap-3">
        <input type="hidden" name="test" value={test} />
        {species.length > 1 ? (
          <div className="grid grid-cols-2 gap-2.5">
            <SelectField id="compare-first" name="compare" label="Compare" isRequired={false} emptyLabel="None" options={species} defaultValue={compare[0] ?? ""} />
            <SelectField id="compare-second" name="compare" label="with" isRequired={false} emptyLabel="None" options={species} defaultValue={compare[1] ?? ""} />
          </div>
        ) : null}
        <SelectField
          id="ranking-at"
          name="at"
          label="Ranking as it was"
          isRequired={false}
          emptyLabel="Now"
          options={moments.map(({ sequence, when, kind }) => ({ value: String(sequence), label: `After no. ${sequence}, ${observationKindNames[kind].toLowerCase()}, ${when}` }))}
          defaultValue={view.atSequence === null ? "" : String(view.atSequence)}
        />
        <SelectField
          id="ranking-prior"
          name="prior"
          label="Before any reading"
          options={[
            { value: "prevalence", label: "Species weigh by how common they are" },
            { value: "even", label: "All species weigh alike" },
          ]}
          defaultValue={prior}
        />
        {hasStruck ? <CheckboxField id="ranking-struck" name="struck" label="With what the struck readings said" defaultChecked={view.areStruckCounted} /> : null}
        <div className="flex items-center gap-4">
          <Button look="quiet">Show</Button>
          {isOpen ? (
            <Link to={`?test=${test}`} preventScrollReset className="text-link text-sm">
              Back to now
            </Link>
          ) : null}
        </div>
      </Form>
    </details>
  );
}
