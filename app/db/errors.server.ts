export type ConstraintKind = "duplicate" | "parent" | "check";

/** Which constraint a failed statement broke. By number: the driver's label for 4025 names another error. */
export function constraintKind(error: unknown): ConstraintKind | undefined {
  switch (errnoOf(error)) {
    case 1062:
      return "duplicate";
    case 1451:
    case 1452:
      return "parent";
    case 4025:
      return "check";
    default:
      return undefined;
  }
}

/** A deadlock, a lock wait that ran out, or a row that changed under a snapshot: the whole transaction may be tried again. */
export function isRetryable(error: unknown): boolean {
  return [1213, 1205, 1020].includes(errnoOf(error) ?? 0);
}

export function isDatabaseGone(error: unknown): boolean {
  return ["ECONNREFUSED", "PROTOCOL_CONNECTION_LOST", "ECONNRESET", "EPIPE", "ETIMEDOUT"].includes(
    String(chain(error).find((link) => typeof link.code === "string")?.code ?? ""),
  );
}

function errnoOf(error: unknown): number | undefined {
  const found = chain(error).find((link) => typeof link.errno === "number" && link.errno > 0);
  return found?.errno as number | undefined;
}

/** Drizzle wraps the driver's error: the numbers sit in its cause. */
function chain(error: unknown): Array<{ errno?: unknown; code?: unknown; cause?: unknown }> {
  const links = [];
  for (let link = error; link !== null && typeof link === "object" && links.length < 5; link = (link as { cause?: unknown }).cause) {
    links.push(link as { errno?: unknown; code?: unknown; cause?: unknown });
  }
  return links;
}
