import { index, layout, prefix, route, type RouteConfig } from "@react-router/dev/routes";

export default [
  index("routes/home.tsx"),
  route("healthz", "routes/healthz.ts"),
  route("room", "routes/room.ts"),

  // accounts
  // register (public)
  route("v", "routes/register/ask.ts"),
  route("v/:code", "routes/register/entry.ts"),
  route("v/:code/photo.jpg", "routes/register/photo.ts"),
  route("v/:code/fingerprint.json", "routes/register/fingerprint.ts"),
  route("check", "routes/register/check.tsx"),

  // payment and other services' calls
  route("pay/:payToken", "routes/pay/invoice.tsx"),
  route("webhooks/stripe", "routes/webhooks/stripe.ts"),

  // the same functions over HTTP

  // a client's own pages
  // a laboratory's pages
  ...prefix("lab/:labSlug", [
    layout("routes/lab/layout.tsx", [
      index("routes/lab/home.ts"),
      // logbook and take-in
      // bench
      // invoices
      route("invoices", "routes/lab/invoices/list.tsx"),
      route("invoices.csv", "routes/lab/invoices/list-csv.ts"),
      route("invoices/:number", "routes/lab/invoices/detail.tsx"),

      // reports
      // settings
    ]),
  ]),
] satisfies RouteConfig;

