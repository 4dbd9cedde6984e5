import { qrPath } from "#app/reports/qr-path.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import type { TakeInView } from "./get-take-in.server.ts";

/** One label a stone: its code, and the address of its page as a QR code. Nothing of whose it is, what it is or what it is worth. */
export function stoneLabels({ services, laboratory }: Pick<LabContext, "services" | "laboratory">, takeIn: TakeInView) {
  return takeIn.items.flatMap((item) => item.stones.map(({ code }) => ({ code, qr: qrPath(`${services.publicOrigin}/lab/${laboratory.slug}/stones/${code}`) })));
}
