// bcryptjs holds an event loop for most of a second at cost 12: it gets one of its own.
import { createHash } from "node:crypto";
import { parentPort } from "node:worker_threads";
import bcrypt from "bcryptjs";

const cost = 12;
// A digest first, so that no byte of a long passphrase past bcrypt's 72 is dropped; base64 holds no NUL.
const digest = (password) => createHash("sha384").update(password, "utf8").digest("base64");
const nobody = bcrypt.hashSync("nobody has this password", cost);

parentPort.on("message", ({ id, task, password, hash }) => {
  try {
    const result = task === "hash" ? bcrypt.hashSync(digest(password), cost) : bcrypt.compareSync(digest(password), hash ?? nobody) && hash !== null;
    parentPort.postMessage({ id, result });
  } catch (error) {
    parentPort.postMessage({ id, error: String(error) });
  }
});
