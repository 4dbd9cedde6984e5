import mysql from "mysql2/promise";
import { inject } from "vitest";
import { cookieOf } from "./sign-in.ts";

const { url, databaseUrl } = inject("journey");

export const people = {
  owner: "rosalind@marramquay.example",
  gemmologist: "ifeoma@marramquay.example",
  appraiser: "teodora@marramquay.example",
  desk: "joss@marramquay.example",
  otherOwner: "corwen@tarnandvale.example",
  client: "ardenne@estate.example",
} as const;
export type PersonKey = keyof typeof people;

/** Marks the tests' own statements in the log of statements. */
export const asTest = "/* test */";

export async function rows<Row>(statement: string, values: Array<string | Buffer> = []): Promise<Row[]> {
  const connection = await mysql.createConnection({ uri: databaseUrl, timezone: "Z" });
  try {
    return (await connection.query(`${asTest} ${statement}`, values))[0] as Row[];
  } finally {
    await connection.end();
  }
}

/** Everybody of the demonstration, signed in, and somebody whose session has been ended, and one whose session has run out. */
export async function signAllIn(): Promise<Record<PersonKey | "revoked" | "expired", string>> {
  const keys = Object.keys(people) as PersonKey[];
  const cookies = Object.fromEntries(await Promise.all(keys.map(async (key) => [key, await cookieOf(url, people[key])] as const))) as Record<PersonKey, string>;
  const newest = async () => (await rows<{ hash: Buffer }>("select s.token_hash hash from sessions s join users u on u.id = s.user_id where u.email = ? order by s.created_at desc limit 1", [people.owner]))[0]!.hash;
  const revoked = await cookieOf(url, people.owner);
  await fetch(`${url}/sign-out`, { method: "POST", redirect: "manual", headers: { cookie: revoked, origin: url } });
  const expired = await cookieOf(url, people.owner);
  await rows("update sessions set expires_at = '2020-01-01' where token_hash = ?", [await newest()]);
  return { ...cookies, revoked, expired };
}
