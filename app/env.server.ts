import { z } from "zod";

const schema = z.object({
  NODE_ENV: z.enum(["development", "production", "test"]).default("development"),
  DATABASE_URL: z.string().regex(/^(mysql|mariadb):\/\//, "must start with mysql://"),
  PUBLIC_ORIGIN: z.url().transform((url) => new URL(url).origin),
  SESSION_SECRET: z.string().min(32, "at least 32 characters"),
  COOKIE_SECURE: z.enum(["0", "1"]).optional(),
  STRIPE_SECRET_KEY: z.string().min(1),
  STRIPE_WEBHOOK_SECRET: z.string().min(1),
  STRIPE_API_URL: z.url().optional(),
  UPLOADTHING_TOKEN: z.string().min(1),
  UPLOADTHING_API_URL: z.url().optional(),
  UPLOADTHING_INGEST_URL: z.url().optional(),
  UPLOADTHING_CALLBACK_URL: z.url().optional(),
  UPLOADTHING_FILE_URL: z.url().optional(),
  SMTP_URL: z.string().regex(/^smtps?:\/\//, "must start with smtp:// or smtps://"),
  MAIL_FROM: z.string().default("Isogyre <no-reply@isogyre.example>"),
  ISOGYRE_DEMO: z.enum(["0", "1"]).default("0"),
  ISOGYRE_JOBS: z.enum(["0", "1"]).default("1"),
  LOG_LEVEL: z.enum(["debug", "info", "warn", "error", "silent"]).default("info"),
});

export type Env = z.infer<typeof schema> & { isCookieSecure: boolean };

/** The only door to the environment. @throws Error that lists every setting that is missing or wrong */
export function readEnv(source: NodeJS.ProcessEnv = process.env): Env {
  const parsed = schema.safeParse(source);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join(".")}: ${issue.message}`);
    throw new Error(`The environment is not complete:\n${lines.join("\n")}`);
  }
  const isHttps = parsed.data.PUBLIC_ORIGIN.startsWith("https:");
  return { ...parsed.data, isCookieSecure: parsed.data.COOKIE_SECURE ? parsed.data.COOKIE_SECURE === "1" : isHttps };
}
