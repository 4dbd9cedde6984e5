import { rows } from "./world.ts";

/** Who may open a page or send to it: everybody, whoever is signed in, or these roles of the laboratory. */
type Access = "anyone" | "signedIn" | readonly Role[];
type Role = "owner" | "gemmologist" | "appraiser" | "desk";
export type RouteLine = {
  /** As in app/routes.ts. */
  path: string;
  /** The parameters of rows of Marram Quay, by name. */
  params?: Readonly<Record<string, string>>;
  get?: Access;
  post?: Access;
  /** What a person who may gets, when it isn't 200 (a redirect, a form's 4xx when there is nothing in it). */
  getStatus?: number;
  /** The parameters name no row of a laboratory but what all of them share: there for every laboratory's people at their own address. */
  isShared?: true;
  /** A secret in the address lets people in, or a signature does. */
  bySecret?: true;
};

const all: readonly Role[] = ["owner", "gemmologist", "appraiser", "desk"];
const front: readonly Role[] = ["owner", "desk"];
const examine: readonly Role[] = ["owner", "gemmologist", "appraiser"];
const lab = (path: string, more: Omit<RouteLine, "path">): RouteLine => ({ path: `lab/:labSlug${path ? `/${path}` : ""}`, ...more });

/** A line a route; a route without one fails the matrix. */
export async function routeLines(): Promise<RouteLine[]> {
  const one = async (statement: string) => (await rows<{ value: string }>(statement))[0]!.value;
  const mq = "(select id from laboratories where slug = 'marram-quay')";
  const ref = (table: string, where = "1 = 1") => one(`select lower(hex(id)) value from ${table} where laboratory_id = ${mq} and ${where} limit 1`);
  const { shortRef } = await import("#app/domain/short-ref.ts");
  const asRef = async (table: string, where?: string) => shortRef((await ref(table, where)).replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, "$1-$2-$3-$4-$5") as never);
  const photo = { photoRef: await asRef("attachments") };
  const examined = { stoneCode: "MQ-26-0015-1" };
  const measured = { stoneCode: "MQ-26-0013-1" };
  const issued = { number: "MQ-R-26-00005" };
  const code = { code: await one(`select code value from reports where number = '${issued.number}'`) };
  const invoice = { number: "MQ-I-26-00008" };
  const takeIn = { number: "MQ-T-26-0008" };
  return [
    { path: "", get: "anyone" },
    { path: "healthz", get: "anyone" },
    { path: "room", post: "anyone" },
    { path: "spectrum-view", post: "anyone" },
    { path: "species-table/:fileName", params: { fileName: "none.json" }, get: "anyone", getStatus: 404 },
    { path: "species-names/:fileName", params: { fileName: "none.json" }, get: "anyone", getStatus: 404 },
    { path: "sign-in", get: "anyone", post: "anyone" },
    { path: "sign-up", get: "anyone", post: "anyone" },
    { path: "sign-up/sent", get: "anyone" },
    { path: "confirm-email/:token", params: { token: "x".repeat(43) }, get: "anyone", post: "anyone", getStatus: 404, bySecret: true },
    { path: "forgot-password", get: "anyone", post: "anyone" },
    { path: "reset-password/:token", params: { token: "x".repeat(43) }, get: "anyone", post: "anyone", getStatus: 404, bySecret: true },
    { path: "invitation/:token", params: { token: "x".repeat(43) }, get: "anyone", post: "anyone", getStatus: 404, bySecret: true },
    { path: "laboratories", get: "signedIn" },
    { path: "account", get: "signedIn", post: "signedIn" },
    { path: "sign-out", post: "anyone" },
    { path: "v", get: "anyone" },
    { path: "v/:code", params: code, get: "anyone" },
    { path: "v/:code/photo.jpg", params: code, get: "anyone" },
    { path: "v/:code/fingerprint.json", params: code, get: "anyone" },
    { path: "check", get: "anyone" },
    { path: "pay/:payToken", params: { payToken: "x".repeat(43) }, get: "anyone", post: "anyone", getStatus: 404, bySecret: true },
    { path: "webhooks/stripe", post: "anyone", bySecret: true },
    { path: "api/uploadthing", get: "anyone", post: "anyone", bySecret: true },
    { path: "api/v1/rank", post: "anyone", bySecret: true },
    { path: "api/v1/rotation-fit", post: "anyone", bySecret: true },
    { path: "api/v1/density", post: "anyone", bySecret: true },
    { path: "my", get: "signedIn" },
    { path: "my/reports/:code/:fileName", params: { ...code, fileName: "report.pdf" }, get: "signedIn", getStatus: 404 },
    lab("", { get: all, getStatus: 302 }),
    lab("stones", { get: all }),
    lab("stones.csv", { get: all }),
    lab("take-ins/new", { get: front, post: front }),
    lab("take-ins/:number", { params: takeIn, get: all, post: ["owner", "gemmologist", "desk"] }),
    lab("take-ins/:number/receipt", { params: takeIn, get: all }),
    lab("take-ins/:number/labels", { params: takeIn, get: all }),
    lab("parcels", { get: examine }),
    lab("parcels.csv", { get: examine }),
    lab("parcels/new", { get: ["gemmologist"], post: ["gemmologist"] }),
    lab("parcels/:parcelRef", { params: { parcelRef: await asRef("parcels") }, get: examine, post: ["gemmologist"] }),
    lab("photos/:photoRef", { params: photo, get: all }),
    lab("photos/:photoRef/thumbnail", { params: photo, get: all }),
    lab("clients", { get: all }),
    lab("clients.csv", { get: all }),
    lab("clients/find", { get: all }),
    lab("clients/new", { get: front, post: front }),
    lab("clients/:clientRef", { params: { clientRef: await asRef("clients") }, get: all, post: front }),
    lab("instruments", { get: all }),
    lab("instruments/new", { get: ["owner", "gemmologist"], post: ["owner", "gemmologist"] }),
    lab("instruments.csv", { get: all }),
    lab("instruments/recall", { get: examine, post: ["owner", "gemmologist"] }),
    lab("instruments/recall.csv", { get: examine }),
    lab("instruments/references", { get: all, post: ["owner", "gemmologist"] }),
    lab("instruments/references/:referenceRef", { params: { referenceRef: await asRef("reference_materials") }, get: all, post: ["owner", "gemmologist"] }),
    lab("instruments/:instrumentRef/correction", { params: { instrumentRef: await asRef("instruments") }, get: ["owner", "gemmologist"], post: ["owner", "gemmologist"] }),
    lab("instruments/:instrumentRef", { params: { instrumentRef: await asRef("instruments") }, get: all, post: ["owner", "gemmologist"] }),
    lab("species", { get: all }),
    lab("species.csv", { get: all }),
    lab("species/compare", { get: all }),
    lab("species/map", { get: all }),
    lab("species/:speciesId", { params: { speciesId: "corundum" }, get: all, isShared: true }),
    lab("stones/:stoneCode", { params: examined, get: all, post: ["gemmologist"] }),
    lab("stones/:stoneCode/mark.json", { params: examined, get: all }),
    lab("stones/:stoneCode/sent-readings", { params: examined, post: ["gemmologist"] }),
    lab("stones/:stoneCode/sheet", { params: examined, get: all }),
    lab("stones/:stoneCode/inclusions", { params: measured, get: examine, post: ["gemmologist"] }),
    lab("stones/:stoneCode/spectra", { params: measured, get: examine, post: ["gemmologist"] }),
    lab("stones/:stoneCode/spectra/:sequence/file", { params: { ...measured, sequence: "1" }, get: examine }),
    lab("stones/:stoneCode/readings/:sequence/strike", { params: { ...examined, sequence: "1" }, get: examine, post: ["gemmologist"] }),
    lab("stones/:stoneCode/conclusion", { params: examined, get: examine, post: ["gemmologist"] }),
    lab("stones/:stoneCode/second-check", { params: { stoneCode: "MQ-26-0016-1" }, get: examine, post: ["gemmologist"] }),
    lab("stones/:stoneCode/valuation", { params: { stoneCode: "MQ-26-0008-1" }, get: ["owner", "appraiser"], post: ["appraiser"] }),
    lab("stones/:stoneCode/report", { params: { stoneCode: "MQ-26-0008-1" }, get: examine, post: ["gemmologist", "appraiser"] }),
    lab("stones/:stoneCode/report/draft.pdf", { params: { stoneCode: "MQ-26-0008-1" }, get: examine }),
    lab("invoices", { get: front }),
    lab("invoices.csv", { get: front }),
    lab("invoices/:number", { params: invoice, get: front, post: front }),
    lab("reports", { get: all }),
    lab("reports.csv", { get: all }),
    lab("reports/:number", { params: issued, get: all, post: all }),
    lab("reports/:number/file.pdf", { params: issued, get: all }),
    lab("settings", { get: ["owner"], post: ["owner"] }),
    lab("settings/team", { get: ["owner"], post: ["owner"] }),
    lab("settings/prices", { get: front, post: ["owner"] }),
  ];
}

export const roles = all;

/** The address of a line in a laboratory. */
export function addressOf({ path, params = {} }: RouteLine, { labSlug = "marram-quay" }: { labSlug?: string } = {}): string {
  return `/${path.replace(":labSlug", labSlug).replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(params[name]!))}`;
}
