import { Card, CardBody } from "#app/components/ui/card.tsx";
import { formatAmount, formatMoney } from "#app/domain/money/format-money.ts";
import { money, type CurrencyCode } from "#app/domain/money/money.ts";

/** How much of what the insurer covers is in the house, by what clients declared. */
export function HeldCard({ heldMinor, limitMinor, addedMinor, currency }: { heldMinor: number; limitMinor: number | null; addedMinor: number; currency: CurrencyCode }) {
  const after = heldMinor + addedMinor;
  const share = limitMinor ? Math.min(1, after / limitMinor) : 0;
  const isAbove = limitMinor !== null && after > limitMinor;
  return (
    <Card title="Held today" id="held">
      <CardBody>
        <p className="flex flex-wrap justify-between gap-x-3">
          <span>Declared, in the house</span>
          <span className="font-mono">
            {formatAmount(money(heldMinor, currency))}
            {limitMinor === null ? "" : ` / ${formatAmount(money(limitMinor, currency))}`} {currency}
          </span>
        </p>
        {limitMinor === null ? (
          <p className="mt-2 text-[12.5px] text-ink-3">No insurer's limit is entered for this laboratory.</p>
        ) : (
          <>
            <div className="mt-2 h-1.5 overflow-hidden rounded-full bg-rule" role="img" aria-label={`${Math.round(share * 100)} % of the limit`}>
              <div className="ramp h-full rounded-full" style={{ width: `${share * 100}%` }} />
            </div>
            <p className={`mt-2 text-[12.5px] ${isAbove ? "font-semibold text-red" : "text-ink-3"}`}>
              {addedMinor > 0 ? `This brings it to ${formatMoney(money(after, currency))}${isAbove ? ", above the limit" : ""}.` : "Goods away are not counted."}
            </p>
          </>
        )}
      </CardBody>
    </Card>
  );
}
