import { and, asc, eq, sql } from "drizzle-orm";
import { clients, instruments, invoices, items, stones, takeIns, users, type CustodyPurpose } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ConsentCode } from "#app/domain/consent-code.ts";
import type { Id } from "#app/domain/ids.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

type CustodyRow = {
  sequence: number;
  purpose: CustodyPurpose;
  fromPlace: string;
  toPlace: string;
  holder: string | null;
  massText: string;
  massUnit: "ct" | "g" | null;
  seal: string;
  remark: string;
  at: string;
  by: string;
};

/**
 * A take-in as its page and its receipt show it. Declared values are there for the desk and the owner alone; sums of
 * the invoice likewise.
 */
export async function getTakeIn(ctx: LabContext, number: string) {
  requireRole(ctx, "takeIn.read");
  const { db, laboratoryId, roles } = ctx;
  const rows = await db
    .select({
      takeIn: {
        id: takeIns.id,
        number: takeIns.number,
        handedOverBy: takeIns.handedOverBy,
        capacity: takeIns.capacity,
        receivedAt: takeIns.receivedAt,
        dueOn: takeIns.dueOn,
        services: takeIns.services,
        returnMethod: takeIns.returnMethod,
        clientStatements: takeIns.clientStatements,
        feeAgreedAt: takeIns.feeAgreedAt,
      },
      client: { id: clients.id, name: clients.name, contactName: clients.contactName, email: clients.email, phone: clients.phone, addressLines: clients.addressLines, terms: clients.terms },
      invoice: { number: invoices.number, state: invoices.state, currency: invoices.currency, netMinor: invoices.netMinor, taxMinor: invoices.taxMinor, totalMinor: invoices.totalMinor },
      item: {
        id: items.id,
        number: items.number,
        description: items.description,
        stoneCount: items.stoneCount,
        mount: items.mount,
        massText: items.massText,
        massUnit: items.massUnit,
        condition: items.condition,
        declaredValueMinor: items.declaredValueMinor,
        declaredCurrency: items.declaredCurrency,
      },
      stone: { code: stones.code, goodsState: stones.goodsState, examinationState: stones.examinationState, place: stones.place },
      receivedBy: users.name,
      balance: instruments.name,
      holder: sql<string | null>`(select h.name from users h where h.id = ${stones.holderId})`,
      consents: sql<string | null>`(select json_arrayagg(c.code) from item_consents c where c.laboratory_id = ${items.laboratoryId} and c.item_id = ${items.id} and c.is_given)`,
      photos: sql<string | null>`(select json_arrayagg(hex(a.id) order by a.created_at, a.id) from attachments a where a.laboratory_id = ${items.laboratoryId} and a.item_id = ${items.id})`,
      custody: sql<string | null>`(select json_arrayagg(json_object('sequence', e.sequence, 'purpose', e.purpose, 'fromPlace', e.from_place, 'toPlace', e.to_place, 'holder', h.name,
        'massText', e.mass_text, 'massUnit', e.mass_unit, 'seal', e.seal, 'remark', e.remark, 'at', date_format(e.at, '%Y-%m-%dT%H:%i:%s.%fZ'), 'by', b.name) order by e.sequence)
        from custody_events e join users b on b.id = e.by left join users h on h.id = e.holder_id where e.laboratory_id = ${items.laboratoryId} and e.item_id = ${items.id})`,
    })
    .from(takeIns)
    .innerJoin(clients, and(eq(clients.laboratoryId, takeIns.laboratoryId), eq(clients.id, takeIns.clientId)))
    .innerJoin(users, eq(users.id, takeIns.receivedBy))
    .innerJoin(items, and(eq(items.laboratoryId, takeIns.laboratoryId), eq(items.takeInId, takeIns.id)))
    .innerJoin(instruments, and(eq(instruments.laboratoryId, items.laboratoryId), eq(instruments.id, items.balanceId)))
    .innerJoin(stones, and(eq(stones.laboratoryId, items.laboratoryId), eq(stones.itemId, items.id)))
    .leftJoin(
      invoices,
      and(
        eq(invoices.laboratoryId, takeIns.laboratoryId),
        eq(invoices.id, sql`(select v.id from invoices v where v.laboratory_id = ${takeIns.laboratoryId} and v.take_in_id = ${takeIns.id} order by v.state = 'void', v.created_at desc limit 1)`),
      ),
    )
    .where(and(eq(takeIns.laboratoryId, laboratoryId), eq(takeIns.number, number)))
    .orderBy(asc(items.position), asc(stones.sequence));
  const head = rows[0];
  if (!head) throw new AppError("not_found", "There is no such take-in.");

  const seesDeclared = isAllowed(roles, "declaredValue.read");
  const byItem = groupByItem(rows);
  return {
    ...head.takeIn,
    receivedBy: head.receivedBy,
    client: { ...head.client, ref: shortRef(head.client.id) },
    invoice: isAllowed(roles, "invoices.read") && head.invoice?.number ? head.invoice : null,
    items: [...byItem.values()].map((itsRows) => {
      const { item, balance, consents, photos, custody } = itsRows[0]!;
      return {
        ...item,
        balance,
        declaredValueMinor: seesDeclared ? item.declaredValueMinor : null,
        declaredCurrency: seesDeclared ? item.declaredCurrency : null,
        stones: itsRows.map((row) => ({ ...row.stone, holder: row.holder })),
        goodsState: itsRows[0]!.stone.goodsState,
        consents: parse<ConsentCode[]>(consents),
        photos: parse<string[]>(photos).map((hex) => shortRef(hex.toLowerCase() as Id<"attachment">)),
        custody: parse<CustodyRow[]>(custody).map((event) => ({ ...event, at: new Date(event.at) })),
      };
    }),
  };
}

export type TakeInView = Awaited<ReturnType<typeof getTakeIn>>;

function groupByItem<Row extends { item: { id: string } }>(rows: readonly Row[]): Map<string, Row[]> {
  const groups = new Map<string, Row[]>();
  for (const row of rows) groups.set(row.item.id, [...(groups.get(row.item.id) ?? []), row]);
  return groups;
}

// The driver parses some JSON columns itself, but not every expression's.
function parse<T extends unknown[]>(json: string | null | T): T {
  if (json === null) return [] as unknown as T;
  return typeof json === "string" ? (JSON.parse(json) as T) : json;
}
