import { index, layout, prefix, route, type RouteConfig } from "@react-router/dev/routes";

export default [
  index("routes/home.tsx"),
  route("healthz", "routes/healthz.ts"),
  route("room", "routes/room.ts"),

  // accounts
  // register (public)
  // payment and other services' calls
  // the same functions over HTTP

  // a client's own pages
  // a laboratory's pages
  ...prefix("lab/:labSlug", [
    layout("routes/lab/layout.tsx", [
      index("routes/lab/home.ts"),
      // logbook and take-in
      // bench
      // invoices
      // reports
      // settings
    ]),
  ]),
] satisfies RouteConfig;

