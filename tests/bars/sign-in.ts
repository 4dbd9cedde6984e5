import demonstration from "../../scripts/demo-people.json" with { type: "json" };

/** Signs in over HTTP as one of the demonstration people. Returns the cookie to send. */
export async function cookieOf(url: string, email: string): Promise<string> {
  const answer = await fetch(`${url}/sign-in`, { method: "POST", redirect: "manual", headers: { origin: url }, body: new URLSearchParams({ email, password: demonstration.password }) });
  if (answer.status !== 302 && answer.status !== 303) throw new Error(`${email} could not sign in: ${answer.status}`);
  return answer.headers.getSetCookie().map((cookie) => cookie.split(";")[0]!).join("; ");
}
