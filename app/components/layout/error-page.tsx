import { isRouteErrorResponse } from "react-router";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Mark } from "./mark.tsx";

type ErrorWords = { title: string; message: string };

/** Words for whatever reached an error boundary: a planned refusal speaks for itself, a bug is owned. */
export function errorWords(error: unknown): ErrorWords {
  if (isRouteErrorResponse(error)) {
    const planned = typeof error.data === "object" && error.data !== null && "userMessage" in error.data ? String(error.data.userMessage) : null;
    const title = { 403: "Not for this role", 404: "Not found", 409: "Changed meanwhile", 429: "Too many at once", 503: "Not available just now" }[error.status] ?? "This did not work";
    return { title, message: planned ?? (error.status === 404 ? "There is nothing at this address. Check it, or start again from the logbook." : "The request could not be understood. Go back, and try it again.") };
  }
  return { title: "This did not work", message: "The fault is ours and has been logged. Nothing was half-saved. Try again in a minute; if it stays, tell us what you were doing." };
}

export function ErrorPage({ error, homeTo = "/" }: { error: unknown; homeTo?: string }) {
  const { title, message } = errorWords(error);
  return (
    <>
      <div className="ramp h-1" />
      <main className="mx-auto max-w-xl px-6 py-16">
        <Mark size={44} />
        {isRouteErrorResponse(error) ? <p className="mt-5 font-mono text-sm text-ink-3">{error.status}</p> : null}
        <h1 className="mt-1">{title}</h1>
        <p className="mt-4 text-lg text-ink-2">{message}</p>
        <p className="mt-6">
          <LinkButton to={homeTo} reloadDocument>
            Start again
          </LinkButton>
        </p>
      </main>
    </>
  );
}
