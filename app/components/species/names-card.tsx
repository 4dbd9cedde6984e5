import { Card, CardBody } from "#app/components/ui/card.tsx";
import type { SpeciesSheet } from "#app/features/species/get-species.server.ts";
import type { SpeciesKind } from "#app/gemmology/species/species-row.ts";
import { FormAnchor } from "./form-link.tsx";

/** How a report says what a thing is by nature (16 CFR 23, 2018; ISO 18323:2015). */
const natureWords: Readonly<Record<SpeciesKind, string>> = {
  natural: "its species by name. “Natural” speaks of how it formed and never stands for “untreated”.",
  synthetic: "“synthetic” with the species, as large as the species itself; for diamond also “laboratory-grown”.",
  artificial: "the material by its own name as an artificial product, with no gem’s name in it.",
  composite: "“composite” or the kind of assembly, and each part by name.",
  organic: "the material and, for pearls, always “natural”, “cultured” or “imitation”.",
  rock: "the rock by name; the chief minerals where they are known.",
};

type NamesCardProps = Pick<SpeciesSheet, "avoid" | "notThis"> & { form: Pick<SpeciesSheet["form"], "name" | "kind" | "tradeNames">; base: string };

/** What a report calls it and the names it must avoid. */
export function NamesCard({ avoid, notThis, form: { name, kind, tradeNames }, base }: NamesCardProps) {
  return (
    <Card title="Names on a report">
      <CardBody className="grid gap-3">
        <p>
          <span className="text-ink-3">Say </span>
          {natureWords[kind]}
        </p>
        {tradeNames.length > 0 ? (
          <p>
            <span className="text-ink-3">Trade and variety names </span>
            {tradeNames.join(", ")}
          </p>
        ) : null}
        {avoid.length > 0 ? (
          <section>
            <h3 className="text-base">Avoid for {name}</h3>
            <ul className="mt-1 flex flex-wrap gap-x-4 gap-y-1">
              {avoid.map((one) => (
                <li key={one.name}>
                  <s className="decoration-red">{one.name}</s>
                  {one.note ? <span className="text-xs text-ink-3"> {one.note}</span> : null}
                </li>
              ))}
            </ul>
          </section>
        ) : null}
        {notThis.length > 0 ? (
          <section>
            <h3 className="text-base">Sounds like it, and is not</h3>
            <ul className="mt-1 grid gap-1">
              {notThis.map((one) => (
                <li key={one.name}>
                  <s className="decoration-red">{one.name}</s>:{" "}
                  {one.means.length === 0
                    ? (one.note ?? "used for other stones")
                    : one.means.map((link, at) => (
                        <span key={link.formId}>
                          {at > 0 ? " or " : ""}
                          <FormAnchor base={base} link={link} />
                        </span>
                      ))}
                </li>
              ))}
            </ul>
          </section>
        ) : null}
        <p className="text-sm text-ink-2">No report says genuine, real, precious, semi-precious, flawless, gem quality or investment. A place before a name is an opinion on origin: only from a report that examined it.</p>
      </CardBody>
    </Card>
  );
}
