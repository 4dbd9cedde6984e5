import { isPortFree } from "./db.mjs";
import { Stop } from "./say.mjs";

/** What each port is for, and the setting that moves it. */
const wanted = {
  PORT: { fallback: 3000, user: "The web server" },
  DB_PORT: { fallback: 33306, user: "The private database" },
  STRIPE_PORT: { fallback: 33308, user: "The stand-in for Stripe" },
  UPLOADTHING_PORT: { fallback: 33307, user: "The stand-in for UploadThing" },
  MAIL_PORT: { fallback: 33309, user: "The stand-in for the mail server" },
  MAILBOX_PORT: { fallback: 33310, user: "The mailbox page" },
};

export function portOf(name) {
  const text = process.env[name];
  if (text === undefined || text === "") return wanted[name].fallback;
  if (!/^\d+$/.test(text) || Number(text) < 1 || Number(text) > 65_535) throw new Stop(`${name}=${text} is not a port: it must be a number from 1 to 65535.`);
  return Number(text);
}

/** @throws Stop that says which, for what and what to do */
export async function requireFree(names) {
  const ports = names.map(portOf);
  const twice = names.find((name, index) => ports.indexOf(portOf(name)) !== index);
  if (twice) throw new Stop(`Port ${portOf(twice)} is asked for twice. Give ${twice} another number.`);
  for (const name of names) if (!(await isPortFree(portOf(name)))) throw new Stop(portTaken(name));
}

export function portTaken(name) {
  const port = portOf(name);
  return `Port ${port} is in use by another program. ${wanted[name].user} needs it: stop that program, or choose another port, for instance\n\n  ${name}=${port + 10} npm start\n`;
}
