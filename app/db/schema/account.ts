import { boolean, foreignKey, index, int, mysqlTable, primaryKey, uniqueIndex, varchar, bigint } from "drizzle-orm/mysql-core";
import { bytes, exactText, id, instant, jsonOf } from "../columns.ts";
import type { ClientId } from "#app/domain/ids.ts";
import type { NewLaboratory } from "#app/domain/new-laboratory.ts";
import type { Role } from "#app/domain/roles.ts";
import { laboratories } from "./laboratory.ts";

export const users = mysqlTable(
  "users",
  {
    id: id<"user">("id").primaryKey(),
    /** Compared without regard to case and accents by the server's collation. */
    email: varchar("email", { length: 254 }).notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    passwordHash: exactText("password_hash", 80),
    passwordChangedAt: instant("password_changed_at"),
    emailConfirmedAt: instant("email_confirmed_at"),
    isDemonstration: boolean("is_demonstration").notNull().default(false),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [uniqueIndex("users_email").on(t.email)],
);

export const memberships = mysqlTable(
  "memberships",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull().references(() => laboratories.id),
    userId: id<"user">("user_id").notNull().references(() => users.id),
    /** Printed below a signature: "Gemmologist, FGA" is the person's own words. */
    title: varchar("title", { length: 120 }).notNull().default(""),
    joinedAt: instant("joined_at").notNull(),
    endedAt: instant("ended_at"),
  },
  (t) => [primaryKey({ columns: [t.laboratoryId, t.userId] }), index("memberships_user").on(t.userId)],
);

export const membershipRoles = mysqlTable(
  "membership_roles",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    userId: id<"user">("user_id").notNull(),
    role: exactText<Role>("role", 12).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.userId, t.role] }),
    foreignKey({ name: "membership_roles_membership", columns: [t.laboratoryId, t.userId], foreignColumns: [memberships.laboratoryId, memberships.userId] }),
  ],
);

/** A sign-in that can be revoked. Only the SHA-256 of the cookie's token is kept. */
export const sessions = mysqlTable(
  "sessions",
  {
    tokenHash: bytes("token_hash", "binary(32)").primaryKey(),
    userId: id<"user">("user_id").references(() => users.id),
    data: jsonOf<Record<string, unknown>>("data").notNull(),
    userAgent: varchar("user_agent", { length: 255 }).notNull().default(""),
    createdAt: instant("created_at").notNull(),
    lastSeenAt: instant("last_seen_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
  },
  (t) => [index("sessions_user").on(t.userId), index("sessions_expires").on(t.expiresAt)],
);

export type EmailTokenPurpose = "confirmEmail" | "resetPassword" | "inviteStaff" | "inviteClient";
export type EmailTokenPayload = {
  name?: string;
  roles?: Role[];
  title?: string;
  clientId?: ClientId;
  /** Of the form that asked: sent twice is asked once. */
  requestId?: string;
  /** An account that begins to exist when the address is confirmed. */
  signUp?: { passwordHash: string; laboratory: NewLaboratory };
};

/** A link sent by e-mail. Only the SHA-256 of its token is kept; it works once and for a while. */
export const emailTokens = mysqlTable(
  "email_tokens",
  {
    tokenHash: bytes("token_hash", "binary(32)").primaryKey(),
    purpose: exactText<EmailTokenPurpose>("purpose", 16).notNull(),
    email: varchar("email", { length: 254 }).notNull(),
    userId: id<"user">("user_id").references(() => users.id),
    laboratoryId: id<"laboratory">("laboratory_id").references(() => laboratories.id),
    payload: jsonOf<EmailTokenPayload>("payload").notNull(),
    createdBy: id<"user">("created_by").references(() => users.id),
    createdAt: instant("created_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
    usedAt: instant("used_at"),
  },
  (t) => [index("email_tokens_laboratory").on(t.laboratoryId, t.purpose), index("email_tokens_user").on(t.userId)],
);

/** Counters of the rate limiter, in the shape its library asks for. */
export const rateLimits = mysqlTable(
  "rate_limits",
  {
    key: exactText("key", 255).primaryKey(),
    points: int("points").notNull().default(0),
    expire: bigint("expire", { mode: "number" }),
  },
  (t) => [index("rate_limits_expire").on(t.expire)],
);
