import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { confidenceNames, limitNames, natureNames, treatmentNames, treatmentStatusNames, type LimitCode } from "#app/domain/conclusion.ts";
import { conclusionStatement } from "#app/domain/conclusion-statement.ts";
import type { ConclusionView } from "#app/features/identification/get-conclusion.server.ts";

export type ShownConclusion = Omit<ConclusionView, "concludedAt"> & { concludedWhen: string };

/** A conclusion as it was drawn, whole. */
export function ConclusionCard({ conclusion }: { conclusion: ShownConclusion }) {
  const { title, statements } = conclusionStatement(conclusion);
  const { description } = conclusion;
  return (
    <Card title={title} note={`version ${conclusion.version}, by ${conclusion.by}, ${conclusion.concludedWhen}`}>
      <CardBody className="grid gap-4">
        <p className="max-w-prose font-serif text-lg">{statements.join(" ")}</p>
        <Facts
          isRuled
          rows={[
            { name: "How sure", value: confidenceNames[conclusion.confidence] },
            { name: "Nature", value: [natureNames[conclusion.nature], conclusion.natureEvidence].filter(Boolean).join(". ") },
            {
              name: "Treatments",
              value:
                conclusion.treatments.length > 0 ? (
                  <ul className="grid gap-0.5">
                    {conclusion.treatments.map(({ code, status, extent, evidence }) => (
                      <li key={code}>
                        {treatmentNames[code]}: {treatmentStatusNames[status].toLowerCase()}
                        {extent && extent !== "none" ? `, ${extent}` : ""}
                        {evidence ? `. ${evidence}` : ""}
                      </li>
                    ))}
                  </ul>
                ) : (
                  "Nothing was said of treatments; that does not mean untreated."
                ),
            },
            { name: "Rests on", value: conclusion.evidence },
            {
              name: "Ruled out",
              value: conclusion.rejected.length > 0 ? (
                <ul className="grid gap-0.5">
                  {conclusion.rejected.map(({ name, because }) => (
                    <li key={name}>
                      {name}: {because}
                    </li>
                  ))}
                </ul>
              ) : null,
            },
            { name: "Against it", value: conclusion.contradictionsExplained },
            { name: "Limits", value: conclusion.limits.map((code) => limitNames[code as LimitCode] ?? code).join(" ") },
            { name: "Appearance", value: [description.shape, description.cut, description.transparency, description.colour, description.phenomenon, description.condition].filter(Boolean).join(", ") },
            { name: "Reasoning", value: conclusion.reasoning ? <span className="whitespace-pre-line">{conclusion.reasoning}</span> : null },
            { name: "Ranked with", value: `species table ${conclusion.speciesTableVersion}, model ${conclusion.modelVersion}` },
          ]}
        />
      </CardBody>
    </Card>
  );
}
