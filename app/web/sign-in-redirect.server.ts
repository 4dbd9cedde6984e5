import { redirect } from "react-router";

/** To the sign-in page, and back here afterwards. */
export function signInRedirect(request: Request): Response {
  const url = new URL(request.url);
  const pathname = url.pathname.replace(/\/_\.data$/, "/").replace(/\.data$/, "");
  url.searchParams.delete("_routes");
  // A form that was being sent cannot be replayed: go back to the page that showed it.
  const path = request.method === "GET" ? `${pathname}${url.search}` : pathname;
  return redirect(`/sign-in?next=${encodeURIComponent(path)}`);
}
