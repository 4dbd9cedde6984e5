import { Card, CardBody } from "#app/components/ui/card.tsx";
import { formatAmount, formatMoney } from "#app/domain/money/format-money.ts";
import type { CurrencyCode } from "#app/domain/money/money.ts";
import type { ServiceCode } from "#app/domain/take-in.ts";
import { feeLines, type Price } from "#app/features/invoices/fee-lines.ts";

type FeeCardProps = { prices: readonly Price[]; services: readonly ServiceCode[]; stoneCount: number; taxShareE4: number; taxLabel: string; currency: CurrencyCode; children: React.ReactNode };

/** What the work costs, before anybody examines anything. */
export function FeeCard({ prices, services, stoneCount, taxShareE4, taxLabel, currency, children }: FeeCardProps) {
  const missing = services.filter((service) => !prices.some((price) => price.service === service));
  const fee = missing.length === 0 ? feeLines({ services, prices, stoneCount, taxShareE4, currency }) : null;
  return (
    <Card title="Services and fee" id="fee">
      {fee ? (
        <table className="w-full border-collapse" aria-live="polite">
          <caption className="sr-only">Fee</caption>
          <tbody>
            {fee.lines.map((line) => (
              <tr key={line.service}>
                <th scope="row" className="border-t border-rule px-4.5 py-2 text-left font-normal">
                  {line.label}
                  {line.quantity > 1 ? <span className="text-ink-3"> × {line.quantity} stones</span> : null}
                </th>
                <td className="border-t border-rule px-4.5 py-2 text-right font-mono">{formatAmount(line.net)}</td>
              </tr>
            ))}
            <tr>
              <th scope="row" className="border-t border-rule px-4.5 py-2 text-left font-normal">
                {taxLabel} {taxShareE4 / 100} %
              </th>
              <td className="border-t border-rule px-4.5 py-2 text-right font-mono">{formatAmount(fee.tax)}</td>
            </tr>
            <tr className="font-semibold">
              <th scope="row" className="border-t border-rule px-4.5 py-2 text-left">
                To pay
              </th>
              <td className="border-t border-rule px-4.5 py-2 text-right font-mono">{formatMoney(fee.total)}</td>
            </tr>
          </tbody>
        </table>
      ) : (
        <CardBody>
          <p className="text-straw">The price list does not have every service. An owner completes it under Laboratory; until then nothing can be taken in.</p>
        </CardBody>
      )}
      <CardBody className="pt-3">{children}</CardBody>
    </Card>
  );
}
