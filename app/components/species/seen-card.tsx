import type { ReactNode } from "react";
import { AbsorptionStrip } from "#app/components/charts/absorption-strip.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { CardSection } from "#app/components/ui/card-section.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import type { SpeciesSheet } from "#app/features/species/get-species.server.ts";

const strengths = ["", "weak", "clear", "strong"] as const;

/** What is looked at rather than measured. */
export function SeenCard({ form: { seen, absorption, glow, inclusions, treatments, hasSynthetic } }: { form: SpeciesSheet["form"] }) {
  return (
    <Card title="What is seen">
      <CardSection headingLevel={3}>
        <dl className="grid gap-y-1.5">
          {seen.map(({ label, items }) => (
            <Line key={label} label={label}>
              {items.join("; ")}
            </Line>
          ))}
        </dl>
      </CardSection>
      <CardSection title="Spectrum" headingLevel={3}>
        {absorption.length === 0 ? (
          <p className="text-ink-2">Nothing that helps.</p>
        ) : (
          <>
            <AbsorptionStrip absorption={absorption} />
            <ul className="mt-2 grid gap-x-6 gap-y-0.5 sm:grid-cols-2">
              {absorption.map(({ nm, kind, strength, colour_variety: variety, cause }, at) => (
                <li key={at}>
                  <span className="font-mono">{nm} nm</span> {kind === "cutoff" ? "cut-off" : kind}, {strengths[strength]}
                  <span className="text-ink-3">{[variety, cause].some(Boolean) ? ` · ${[variety, cause].filter(Boolean).join(", ")}` : ""}</span>
                </li>
              ))}
            </ul>
          </>
        )}
      </CardSection>
      <CardSection title="Ultraviolet" headingLevel={3}>
        <dl className="grid gap-y-1.5">
          <Line label="Long wave">{glow.longWave.join("; ") || "not known"}</Line>
          <Line label="Short wave">{glow.shortWave.join("; ") || "not known"}</Line>
          {glow.note ? <Line label="Note">{glow.note}</Line> : null}
        </dl>
        <Caution className="mt-3">Short-wave light at a hand’s distance can pass the limit for eyes and skin within seconds (ICNIRP 2004: 6 mJ/cm² at 254 nm in eight hours). Closed cabinet, goggles that stop it, short looks.</Caution>
      </CardSection>
      {inclusions.length > 0 ? (
        <CardSection title="Under magnification" headingLevel={3}>
          <List items={inclusions} />
        </CardSection>
      ) : null}
      <CardSection title="Treatments and growth" headingLevel={3}>
        {treatments.length > 0 ? <List items={treatments} /> : <p className="text-ink-2">No treatment is usual.</p>}
        <p className="mt-2 text-ink-2">{hasSynthetic ? "It is also made. " : ""}Constants show neither treatment nor who made it: that needs what is seen inside, or a laboratory.</p>
      </CardSection>
    </Card>
  );
}

function Line({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="grid grid-cols-[7.5rem_minmax(0,1fr)] gap-x-4">
      <dt className="text-ink-3">{label}</dt>
      <dd>{children}</dd>
    </div>
  );
}

function List({ items }: { items: readonly string[] }) {
  return (
    <ul className="grid gap-1">
      {items.map((item) => (
        <li key={item} className="border-l-2 border-rule-2 pl-2.5">
          {item}
        </li>
      ))}
    </ul>
  );
}
