import { sql } from "drizzle-orm";
import { AppError } from "#app/domain/app-error.ts";
import type { AppContext } from "./app-context.ts";

/** @throws AppError unavailable when the database does not answer */
export async function checkHealth({ db }: Pick<AppContext, "db">): Promise<void> {
  try {
    await db.execute(sql`select 1`);
  } catch (error) {
    throw new AppError("unavailable", "The database does not answer.", { cause: error });
  }
}
