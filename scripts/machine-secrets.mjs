import { randomBytes } from "node:crypto";
import fs from "node:fs";
import path from "node:path";

/** Of this machine: made at the first start, readable by its owner alone. */
export function machineSecrets(folder) {
  const file = path.join(folder, "secrets.json");
  const kept = fs.existsSync(file) ? JSON.parse(fs.readFileSync(file, "utf8")) : {};
  const secrets = {
    session: randomBytes(32).toString("hex"),
    database: randomBytes(16).toString("hex"),
    webhook: `whsec_${randomBytes(24).toString("hex")}`,
    ...kept,
  };
  if (Object.keys(kept).length < Object.keys(secrets).length) {
    fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
    fs.writeFileSync(`${file}.new`, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
    fs.renameSync(`${file}.new`, file);
  }
  return secrets;
}
