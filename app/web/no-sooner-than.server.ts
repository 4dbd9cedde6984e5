/** Waits for `work`, and until `ms` have passed: how long an answer took then says nothing about what was found. */
export async function noSoonerThan<T>(ms: number, work: Promise<T>): Promise<T> {
  const [result] = await Promise.allSettled([work, new Promise((resolve) => setTimeout(resolve, ms))]);
  if (result.status === "rejected") throw result.reason;
  return result.value;
}
