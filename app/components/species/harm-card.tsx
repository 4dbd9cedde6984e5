import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { Chip, type Tone } from "#app/components/ui/chip.tsx";
import { harmfulTests, type Harm, type HarmfulTest } from "#app/gemmology/species/test-harm.ts";
import type { SpeciesKind } from "#app/gemmology/species/species-row.ts";

const testWords: Readonly<Record<HarmfulTest, string>> = {
  contactLiquid: "contact liquid of the refractometer",
  immersion: "organic immersion liquids",
  water: "weighing in water",
  heavyLiquid: "heavy liquids",
  ultraviolet: "long ultraviolet light",
  thermalProbe: "thermal probe",
  hotLamp: "hot lamps and heat",
  ultrasonic: "ultrasonic and steam cleaning",
  solvent: "acetone and alcohol",
  acid: "acid",
  hardness: "scratch, streak and hot point",
};
const degrees: ReadonlyArray<{ harm: Harm; word: string; tone: Tone }> = [
  { harm: 10, word: "ruins it", tone: "red" },
  { harm: 1, word: "can damage it", tone: "straw" },
  { harm: 0.1, word: "can be undone", tone: "plain" },
  { harm: 0, word: "does no harm", tone: "green" },
];

type HarmCardProps = { harm: Readonly<Record<HarmfulTest, Harm>>; cautions: readonly string[]; kind: SpeciesKind };

/** What must not be done to it, and what each test can do in the worst case. */
export function HarmCard({ harm, cautions, kind }: HarmCardProps) {
  const text = cautions.join("; ");
  return (
    <Card title="Cautions" note="before a test, and after one">
      <CardBody className="grid gap-3">
        {cautions.length > 0 ? (
          <Caution>
            <ul className="grid gap-1">
              {cautions.map((caution) => (
                <li key={caution}>{caution.charAt(0).toUpperCase() + caution.slice(1)}.</li>
              ))}
            </ul>
          </Caution>
        ) : null}
        <dl className="grid gap-2">
          {degrees.map(({ harm: degree, word, tone }) => {
            const tests = harmfulTests.filter((test) => harm[test] === degree);
            return tests.length === 0 ? null : (
              <div key={word} className="grid grid-cols-[7.5rem_minmax(0,1fr)] items-baseline gap-x-3">
                <dt>
                  <Chip tone={tone}>{word}</Chip>
                </dt>
                <dd className="text-ink-2">{tests.map((test) => testWords[test]).join(", ")}</dd>
              </div>
            );
          })}
        </dl>
        <ul className="grid gap-1.5 text-sm text-ink-2">
          <li>The worst that is known of any such stone. Mounted with others, the most tender of them decides. Tests that leave a mark need the client’s consent first.</li>
          <li>Contact and immersion liquids irritate skin and eyes, and some are toxic: gloves, moving air, and wash the stone before ultraviolet light and before it goes back.</li>
          {/radioactiv/.test(text) ? <li>Measure with a survey meter and write down background, reading and distance. No word such as “safe” belongs on the report.</li> : null}
          {kind === "organic" ? <li>Trade in ivory, tortoiseshell, corals and some shells is controlled (CITES), and sending a piece abroad for a test is export. Ask for the permit or the exemption first.</li> : null}
          <li className="text-xs text-ink-3">House values, common practice.</li>
        </ul>
      </CardBody>
    </Card>
  );
}
