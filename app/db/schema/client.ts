import { foreignKey, index, int, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { exactText, id, instant, jsonOf } from "../columns.ts";
import { users } from "./account.ts";
import { laboratories } from "./laboratory.ts";

export const clients = mysqlTable(
  "clients",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull().references(() => laboratories.id),
    id: id<"client">("id").notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    contactName: varchar("contact_name", { length: 120 }).notNull().default(""),
    email: varchar("email", { length: 254 }).notNull().default(""),
    phone: varchar("phone", { length: 40 }).notNull().default(""),
    addressLines: jsonOf<string[]>("address_lines").notNull(),
    note: varchar("note", { length: 2000 }).notNull().default(""),
    /** "account" lets a report be issued before it is paid; only an owner grants it. */
    terms: exactText<"prepaid" | "account">("terms", 8).notNull().default("prepaid"),
    termsGrantedBy: id<"user">("terms_granted_by").references(() => users.id),
    termsGrantedAt: instant("terms_granted_at"),
    createdAt: instant("created_at").notNull(),
    version: int("version").notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    index("clients_name").on(t.laboratoryId, t.name, t.id),
  ],
);

/** People who may see one client's own items, invoices and reports. */
export const clientUsers = mysqlTable(
  "client_users",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    clientId: id<"client">("client_id").notNull(),
    userId: id<"user">("user_id").notNull().references(() => users.id),
    joinedAt: instant("joined_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.clientId, t.userId] }),
    foreignKey({ name: "client_users_client", columns: [t.laboratoryId, t.clientId], foreignColumns: [clients.laboratoryId, clients.id] }),
    index("client_users_user").on(t.userId),
  ],
);
