import { uuidv7 } from "uuidv7";
import { Button } from "#app/components/ui/button.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { observationKindNames, observationKinds } from "#app/domain/reading.ts";
import { readingSeenText, readingValueText } from "#app/features/readings/reading-words.ts";
import { loadOutbox } from "./outbox/load-outbox.ts";
import type { Whose } from "./outbox/outbox.ts";
import type { KeptDeed } from "./outbox/outbox-store.ts";
import { StrikeForm } from "./strike-form.tsx";
import type { WaitingReading } from "./waiting-reading.ts";

type WaitingReadingsProps = { deeds: readonly KeptDeed[]; readings: readonly WaitingReading[]; whose: Whose; stoneCode: string };

/** What was recorded without the line and waits on this device; what the server refused stays until a person decides. */
export function WaitingReadings({ deeds, readings, whose, stoneCode }: WaitingReadingsProps) {
  if (deeds.length === 0) return null;
  const refused = deeds.filter(({ refusal }) => refusal !== null).length;
  const strikeOf = (id: string) => deeds.find(({ kind, fields }) => kind === "strike" && fields.some(([name, value]) => name === "named.requestId" && value === id));
  return (
    <Card title="Waiting on this device" note={refused > 0 ? `${deeds.length - refused} wait for the line, ${refused} refused` : "sent when the line is back, in this order"}>
      <ul aria-live="polite">
        {deeds.map((deed) => {
          const made = readings.find(({ id }) => id === deed.id);
          const strike = strikeOf(deed.id);
          return (
            <li key={deed.place} className="grid gap-1.5 border-t border-rule px-4.5 py-3 text-sm">
              <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
                <span className="whitespace-nowrap">{clockOf(deed.madeAt)}</span>
                <strong className="font-semibold">{deed.kind === "strike" ? "Strike" : nameOf(deed)}</strong>
                <span className={`font-mono ${strike ? "line-through decoration-red" : ""}`}>{made ? (made.reading.quality === "noResult" ? `no reading: ${made.noResultReason}` : readingValueText(made.reading)) : deed.kind === "strike" ? strikeWords(deed) : ""}</span>
                <span className="text-ink-2">{made ? readingSeenText(made.reading) : ""}</span>
                <span className="ml-auto">{deed.refusal === null ? <Chip tone="blue">waiting</Chip> : <Chip tone="red">refused</Chip>}</span>
              </div>
              {deed.refusal === null ? (
                made && !strike ? (
                  <StrikeForm onStrike={async (reason) => (await loadOutbox()).keepDeed({ id: uuidv7(), kind: "strike", ...whose, stoneCode, fields: [["reason", reason], ["named.requestId", deed.id]], madeAt: new Date().toISOString() })} />
                ) : null
              ) : (
                <div className="grid gap-2">
                  <p className="text-red">{deed.refusal}</p>
                  <p className="text-ink-2">It is on this device only. Record it anew if it still holds; then leave this one out.</p>
                  <div>
                    <Button type="button" look="quiet" onClick={() => void loadOutbox().then(({ dropDeed }) => dropDeed(deed.place))}>
                      Leave it out
                    </Button>
                  </div>
                </div>
              )}
            </li>
          );
        })}
      </ul>
    </Card>
  );
}

const fieldOf = ({ fields }: KeptDeed, name: string) => fields.find(([key]) => key === name)?.[1] ?? "";

function nameOf(deed: KeptDeed): string {
  const kind = observationKinds.find((one) => one === fieldOf(deed, "kind"));
  return kind ? observationKindNames[kind] : "Reading";
}

function strikeWords(deed: KeptDeed): string {
  const sequence = fieldOf(deed, "named.sequence");
  return `${sequence ? `reading ${sequence}` : "a reading that waits"}: ${fieldOf(deed, "reason")}`;
}

const clockOf = (instant: string) => new Date(instant).toLocaleTimeString("en-GB", { hour: "2-digit", minute: "2-digit" });
