import { customType, datetime, decimal } from "drizzle-orm/mysql-core";
import type { Id } from "#app/domain/ids.ts";

/** A row id: UUIDv7 text in TypeScript, 16 bytes in MariaDB, so keys stay short and sort by age. */
export function id<Noun extends string>(name: string) {
  return customType<{ data: Id<Noun>; driverData: Buffer }>({
    dataType: () => "binary(16)",
    toDriver: (value) => Buffer.from(value.replaceAll("-", ""), "hex"),
    fromDriver: (value) => {
      const hex = value.toString("hex");
      return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}` as Id<Noun>;
    },
  })(name);
}

/** Text compared byte for byte: the server's default collation would take "AbC" for "abc". */
export function exactText<T extends string = string>(name: string, length: number) {
  return customType<{ data: T; driverData: string }>({
    dataType: () => `varchar(${length}) character set ascii collate ascii_bin`,
  })(name);
}

/** Drizzle's own varbinary decodes to UTF-8 text and destroys bytes. */
export function bytes(name: string, sqlType: `binary(${number})` | "mediumblob" | "longblob") {
  return customType<{ data: Buffer; driverData: Buffer }>({ dataType: () => sqlType })(name);
}

/** MariaDB's JSON is LONGTEXT with a check; some expressions hand it back as text, so parse here. */
export function jsonOf<T>(name: string) {
  return customType<{ data: T; driverData: string }>({
    dataType: () => "json",
    toDriver: (value) => JSON.stringify(value),
    fromDriver: (value) => (typeof value === "string" ? (JSON.parse(value) as T) : (value as T)),
  })(name);
}

/** UTC with milliseconds; without `fsp` MariaDB cuts the fraction. */
export function instant(name: string) {
  return datetime(name, { mode: "date", fsp: 3 });
}

/** A measured value at its instrument's resolution. MariaDB rounds longer decimals silently: check the scale before. */
export function measured(name: string, precision: number, scale: number) {
  return decimal(name, { precision, scale, mode: "number" });
}
