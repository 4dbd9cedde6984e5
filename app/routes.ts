import { index, layout, prefix, route, type RouteConfig } from "@react-router/dev/routes";

export default [
  index("routes/home.tsx"),
  route("healthz", "routes/healthz.ts"),
  route("room", "routes/room.ts"),
  route("spectrum-view", "routes/spectrum-view.ts"),

  route("species-table/:fileName", "routes/species-table.ts"),
  route("species-names/:fileName", "routes/species-names.ts"),

  // accounts
  layout("routes/account/layout.tsx", [
    route("sign-in", "routes/account/sign-in.tsx"),
    route("sign-up", "routes/account/sign-up.tsx"),
    route("sign-up/sent", "routes/account/sign-up-sent.tsx"),
    route("confirm-email/:token", "routes/account/confirm-email.tsx"),
    route("forgot-password", "routes/account/forgot-password.tsx"),
    route("reset-password/:token", "routes/account/reset-password.tsx"),
    route("invitation/:token", "routes/account/invitation.tsx"),
  ]),
  layout("routes/account/signed-in-layout.tsx", [
    route("laboratories", "routes/account/laboratories.tsx"),
    route("account", "routes/account/account.tsx"),
  ]),
  route("sign-out", "routes/account/sign-out.ts"),

  // register (public)
  route("v", "routes/register/ask.ts"),
  route("v/:code", "routes/register/entry.ts"),
  route("v/:code/photo.jpg", "routes/register/photo.ts"),
  route("v/:code/fingerprint.json", "routes/register/fingerprint.ts"),
  route("check", "routes/register/check.tsx"),

  // payment and other services' calls
  route("pay/:payToken", "routes/pay/invoice.tsx"),
  route("webhooks/stripe", "routes/webhooks/stripe.ts"),
  route("api/uploadthing", "routes/uploadthing.ts"),

  // the same functions over HTTP
  route("api/v1/rank", "routes/api/rank.ts"),
  route("api/v1/rotation-fit", "routes/api/rotation-fit.ts"),
  route("api/v1/density", "routes/api/density.ts"),

  // a client's own pages
  layout("routes/my/layout.tsx", [
    route("my", "routes/my/home.tsx"),
    route("my/reports/:code/:fileName", "routes/my/report-pdf.ts"),
  ]),

  // a laboratory's pages
  ...prefix("lab/:labSlug", [
    layout("routes/lab/layout.tsx", [
      index("routes/lab/home.ts"),
      // logbook and take-in
      route("stones", "routes/lab/stones/list.tsx"),
      route("stones.csv", "routes/lab/stones/list-csv.ts"),
      route("take-ins/new", "routes/lab/take-ins/new.tsx"),
      route("take-ins/:number", "routes/lab/take-ins/detail.tsx"),
      route("take-ins/:number/receipt", "routes/lab/take-ins/receipt.tsx"),
      route("take-ins/:number/labels", "routes/lab/take-ins/labels.tsx"),
      route("parcels", "routes/lab/parcels/list.tsx"),
      route("parcels.csv", "routes/lab/parcels/list-csv.ts"),
      route("parcels/new", "routes/lab/parcels/new.tsx"),
      route("parcels/:parcelRef", "routes/lab/parcels/detail.tsx"),
      route("photos/:photoRef", "routes/lab/photos/photo.ts", { id: "lab-photo" }),
      route("photos/:photoRef/thumbnail", "routes/lab/photos/photo.ts", { id: "lab-photo-thumbnail" }),
      route("clients", "routes/lab/clients/list.tsx"),
      route("clients.csv", "routes/lab/clients/list-csv.ts"),
      route("clients/find", "routes/lab/clients/find.ts"),
      route("clients/new", "routes/lab/clients/new.tsx"),
      route("clients/:clientRef", "routes/lab/clients/detail.tsx"),
      route("instruments", "routes/lab/instruments/list.tsx"),
      route("instruments/new", "routes/lab/instruments/new.tsx"),
      route("instruments.csv", "routes/lab/instruments/list-csv.ts"),
      route("instruments/recall", "routes/lab/instruments/recall.tsx"),
      route("instruments/recall.csv", "routes/lab/instruments/recall-csv.ts"),
      route("instruments/references", "routes/lab/instruments/references.tsx"),
      route("instruments/references/:referenceRef", "routes/lab/instruments/reference.tsx"),
      route("instruments/:instrumentRef", "routes/lab/instruments/detail.tsx"),
      route("instruments/:instrumentRef/correction", "routes/lab/instruments/correction.tsx"),

      // species
      route("species", "routes/lab/species/list.tsx"),
      route("species.csv", "routes/lab/species/list-csv.ts"),
      route("species/compare", "routes/lab/species/compare.tsx"),
      route("species/map", "routes/lab/species/map.tsx"),
      route("species/:speciesId", "routes/lab/species/detail.tsx"),

      // bench
      route("stones/:stoneCode", "routes/lab/stones/bench.tsx"),
      route("stones/:stoneCode/mark.json", "routes/lab/stones/mark.ts"),
      route("stones/:stoneCode/sent-readings", "routes/lab/stones/sent-readings.ts"),
      route("stones/:stoneCode/sheet", "routes/lab/stones/sheet.tsx"),
      route("stones/:stoneCode/inclusions", "routes/lab/stones/inclusions.tsx"),
      route("stones/:stoneCode/spectra", "routes/lab/stones/spectra.tsx"),
      route("stones/:stoneCode/spectra/:sequence/file", "routes/lab/stones/spectrum-file.ts"),
      route("stones/:stoneCode/readings/:sequence/strike", "routes/lab/stones/strike.tsx"),
      route("stones/:stoneCode/conclusion", "routes/lab/stones/conclusion.tsx"),
      route("stones/:stoneCode/second-check", "routes/lab/stones/second-check.tsx"),
      route("stones/:stoneCode/valuation", "routes/lab/stones/valuation.tsx"),
      route("stones/:stoneCode/report", "routes/lab/stones/report.tsx"),
      route("stones/:stoneCode/report/draft.pdf", "routes/lab/stones/report-draft.ts"),

      // invoices
      route("invoices", "routes/lab/invoices/list.tsx"),
      route("invoices.csv", "routes/lab/invoices/list-csv.ts"),
      route("invoices/:number", "routes/lab/invoices/detail.tsx"),

      // reports
      route("reports", "routes/lab/reports/list.tsx"),
      route("reports.csv", "routes/lab/reports/list-csv.ts"),
      route("reports/:number", "routes/lab/reports/detail.tsx"),
      route("reports/:number/file.pdf", "routes/lab/reports/pdf.ts"),

      // settings
      route("settings", "routes/lab/settings/laboratory.tsx"),
      route("settings/team", "routes/lab/settings/team.tsx"),
      route("settings/prices", "routes/lab/settings/prices.tsx"),
    ]),
  ]),
] satisfies RouteConfig;

