import { createHash } from "node:crypto";
import { sql } from "drizzle-orm";
import { rateLimits, registerEntries } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { formatRegisterCode, type RegisterCode } from "#app/domain/register-code.ts";
import type { RegisterView } from "#app/domain/register-view.ts";
import type { WithdrawalReason } from "#app/domain/report-state.ts";
import type { AppContext } from "#app/features/app-context.ts";

const asksPerMinute = 60;
const windowMs = 60_000;

export type RegisterEntry = Readonly<{
  code: RegisterCode;
  shownCode: string;
  state: "issued" | "superseded" | "withdrawn";
  view: RegisterView;
  pdfSha256: string;
  issuedAt: Date;
  supersededByNumber: string | null;
  supersededByCode: RegisterCode | null;
  withdrawnAt: Date | null;
  withdrawalReason: WithdrawalReason | null;
  version: number;
}>;

type Row = { points: number; expire: number; entry: Record<string, unknown> | string | null };

/**
 * What the public register says of a code, and one ask counted against the asker's address: a single statement, so that
 * the limit holds exactly for any number of processes and the page costs one query.
 * @returns undefined when the register knows no such code
 * @throws AppError rate_limited beyond 60 asks a minute from one address
 */
export async function askRegister(app: AppContext, code: RegisterCode): Promise<RegisterEntry | undefined> {
  const nowMs = app.now.getTime();
  // The address itself is not kept.
  const key = `register:${createHash("sha256").update(app.clientAddress).digest("base64url").slice(0, 32)}`;
  const e = registerEntries;
  const [rows] = (await app.db.execute(sql`
    insert into ${rateLimits} (\`key\`, points, expire) values (${key}, 1, ${nowMs + windowMs})
    on duplicate key update
      points = if(expire <= ${nowMs}, 1, points + 1),
      expire = if(expire <= ${nowMs}, values(expire), expire)
    returning points, expire, (
      select json_object('state', ${e.state}, 'view', ${e.view}, 'pdfSha256', lower(hex(${e.pdfSha256})),
        'issuedAt', ${e.issuedAt}, 'supersededByNumber', ${e.supersededByNumber}, 'supersededByCode', ${e.supersededByCode},
        'withdrawnAt', ${e.withdrawnAt}, 'withdrawalReason', ${e.withdrawalReason}, 'version', ${e.version})
      from ${e} where ${e.code} = ${code}
    ) as entry`)) as unknown as [Row[]];
  const row = rows[0]!;
  if (Number(row.points) > asksPerMinute) {
    const retryAfterS = Math.max(1, Math.ceil((Number(row.expire) - nowMs) / 1000));
    throw new AppError("rate_limited", `The register was asked more than ${asksPerMinute} times within a minute from here. Try again in ${retryAfterS} seconds.`, { retryAfterS });
  }
  if (row.entry === null) return undefined;
  const entry = (typeof row.entry === "string" ? JSON.parse(row.entry) : row.entry) as Record<string, string | number | null> & { view: RegisterView | string };
  return {
    code,
    shownCode: formatRegisterCode(code),
    state: entry.state as RegisterEntry["state"],
    view: typeof entry.view === "string" ? (JSON.parse(entry.view) as RegisterView) : entry.view,
    pdfSha256: entry.pdfSha256 as string,
    issuedAt: utc(entry.issuedAt as string),
    supersededByNumber: entry.supersededByNumber as string | null,
    supersededByCode: entry.supersededByCode as RegisterCode | null,
    withdrawnAt: entry.withdrawnAt === null ? null : utc(entry.withdrawnAt as string),
    withdrawalReason: entry.withdrawalReason as WithdrawalReason | null,
    version: Number(entry.version),
  };
}

/** json_object writes a datetime as "2026-12-01 10:00:00.000", in UTC as all of ours. */
function utc(text: string): Date {
  return new Date(`${text.replace(" ", "T")}Z`);
}
