import { Form } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { Confirm } from "#app/components/ui/confirm.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { formatNames, xUnitSigns, yUnitNames } from "#app/features/spectra/spectrum-words.ts";
import type { SpectrumItem } from "#app/features/spectra/list-spectra.server.ts";
import { MeasuredPlot } from "./measured-plot.tsx";
import { PeaksForm } from "./peaks-form.tsx";

export type ShownSpectrum = Omit<SpectrumItem, "createdAt" | "withdrawal"> & { when: string; withdrawal: { when: string; by: string; reason: string } | null };
type SpectrumCardProps = { spectrum: ShownSpectrum; benchHref: string | null; sourceHref: string; canWithdraw: boolean; reason?: { value: string; errors: string[] } };

/** One measured spectrum: its curve, what the file says, its peaks. Withdrawn it stays, crossed out. */
export function SpectrumCard({ spectrum, benchHref, sourceHref, canWithdraw, reason }: SpectrumCardProps) {
  const { sequence, withdrawal, xUnit, yUnit } = spectrum;
  return (
    <Card
      id={`spectrum-${sequence}`}
      title={<span className={withdrawal ? "text-ink-3 line-through decoration-red" : ""}>{spectrum.title || `Spectrum ${sequence}`}</span>}
      note={`no. ${sequence}, ${spectrum.when}, ${spectrum.createdBy}`}
      aside={withdrawal ? <Chip tone="red">withdrawn</Chip> : null}
    >
      <CardBody className="grid gap-4">
        {withdrawal ? (
          <p className="text-red">
            Withdrawn {withdrawal.when} by {withdrawal.by}: {withdrawal.reason}
          </p>
        ) : null}
        <MeasuredPlot {...spectrum} label={`Spectrum ${sequence}`} />
        {spectrum.notes.map((note) => (
          <Caution key={note}>{note}</Caution>
        ))}
        <div className="grid items-start gap-x-8 gap-y-4 xl:grid-cols-2">
          <PeaksForm peaks={spectrum.peaks} xUnit={xUnit} sequence={sequence} benchHref={withdrawal ? null : benchHref} />
          <div className="grid gap-3">
            <Facts
              rows={[
                { name: "Note", value: spectrum.note },
                { name: "Measured", value: `${yUnitNames[yUnit]} over ${xUnitSigns[xUnit]}${spectrum.isUnitAssumed ? ", as said when it was attached" : ", as the file says"}` },
                { name: "Range", value: `${round(spectrum.firstX)} to ${round(spectrum.lastX)} ${xUnitSigns[xUnit]}, ${spectrum.pointCount} points`, isMono: true },
                {
                  name: "File",
                  value: (
                    <a href={sourceHref} download className="text-link break-all">
                      {spectrum.fileName}
                    </a>
                  ),
                },
                { name: "Format", value: `${formatNames[spectrum.format]}, ${Math.max(1, Math.round(spectrum.sizeBytes / 1000))} kB` },
              ]}
            />
            {canWithdraw && !withdrawal ? (
              <Confirm summary="Withdraw this spectrum">
                <Form method="post" preventScrollReset className="grid gap-2.5">
                  <input type="hidden" name="intent" value="withdraw" />
                  <input type="hidden" name="sequence" value={sequence} />
                  <TextField id={`reason-${sequence}`} name="reason" label="Why it does not belong to this stone" maxLength={500} defaultValue={reason?.value} errors={reason?.errors} hint="It stays in its place, crossed out, with this reason." />
                  <div>
                    <Button look="danger">Withdraw</Button>
                  </div>
                </Form>
              </Confirm>
            ) : null}
          </div>
        </div>
      </CardBody>
    </Card>
  );
}

const round = (x: number) => Number(x.toPrecision(6));
