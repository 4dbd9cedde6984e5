import { Link, useRouteLoaderData } from "react-router";
import { PublicShell } from "#app/components/layout/public-shell.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Icon, type IconName } from "#app/components/ui/icon.tsx";
import { NoticeBar } from "#app/components/ui/notice.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import type { loader as rootLoader } from "#app/root.tsx";
import { appContext } from "#app/web/contexts.server.ts";
import { findAsker } from "#app/web/find-asker.server.ts";
import { privateMiddleware } from "#app/web/private-middleware.server.ts";
import type { Route } from "./+types/home";

export const middleware: Route.MiddlewareFunction[] = [privateMiddleware];

export async function loader({ request, context }: Route.LoaderArgs) {
  const asker = await findAsker(context.get(appContext), request);
  return { askerName: asker?.name ?? null };
}

export const meta: Route.MetaFunction = () => [
  { title: "Isogyre: from a stone on the desk to a report a stranger can verify" },
  { name: "description", content: "One place for gemmologists and appraisers: custody, readings, candidates, conclusion, second check, valuation, payment and reports that anybody can verify." },
];

const steps: ReadonlyArray<{ icon: IconName; title: string; text: string }> = [
  { icon: "scales", title: "Taken in", text: "Described in neutral words, weighed, photographed, with a receipt and a place for every item until it is handed back." },
  { icon: "stone", title: "Examined", text: "Every reading with its instrument, its uncertainty and who took it. Corrections strike through; nothing is lost. Candidates are ranked with reasons, and a person concludes." },
  { icon: "person", title: "Checked", text: "A second gemmologist looks without seeing the first conclusion. Who works alone checks a day later, and the report says so." },
  { icon: "seal", title: "Reported", text: "A valuation where one was ordered, a fixed fee, and a report with a code. Whoever holds it can ask the register whether it is genuine and current." },
];

export default function HomeRoute({ loaderData }: Route.ComponentProps) {
  const root = useRouteLoaderData<typeof rootLoader>("root");
  return (
    <PublicShell room={root?.room ?? "system"} notice={<NoticeBar notice={root?.notice ?? null} />}>
      <div className="grid gap-x-12 gap-y-8 pt-10 pb-10 lg:grid-cols-[minmax(0,1fr)_22rem] lg:pt-16">
        <div>
          <h1 tabIndex={-1} className="max-w-[22ch] text-[2rem] leading-tight sm:text-[2.5rem]">
            From a stone on the desk to a report a stranger can verify
          </h1>
          <p className="mt-4 max-w-prose text-lg text-ink-2">
            Isogyre is one place for the work of a gemmological laboratory or an appraiser: custody, readings, conclusion, second check, value, payment and the signed report.
          </p>
          <div className="mt-6 flex flex-wrap items-center gap-3">
            {loaderData.askerName ? (
              <LinkButton look="primary" to="/sign-in">
                Go on, {loaderData.askerName}
              </LinkButton>
            ) : (
              <>
                <LinkButton look="primary" to="/sign-in">
                  Sign in
                </LinkButton>
                <LinkButton to="/sign-up">Open a laboratory</LinkButton>
              </>
            )}
          </div>
        </div>
        <Card title="Verify a report" className="self-start">
          <CardBody>
            <form method="get" action="/v" className="grid gap-3">
              <TextField id="code" name="code" label="Code on the report" hint="16 letters and digits in four groups. Capitals and dashes do not matter." isMono autoComplete="off" autoCapitalize="characters" spellCheck={false} maxLength={40} required />
              <Button className="justify-self-start" icon="search">
                Ask the register
              </Button>
            </form>
            <p className="mt-4 text-sm text-ink-2">
              Do you have the PDF?{" "}
              <Link to="/check" className="text-tint">
                Check that it is the very file
              </Link>
              , without sending it anywhere.
            </p>
          </CardBody>
        </Card>
      </div>
      <ol className="grid gap-x-8 gap-y-6 border-t border-rule pt-8 sm:grid-cols-2 lg:grid-cols-4">
        {steps.map(({ icon, title, text }) => (
          <li key={title}>
            <h2 className="flex items-center gap-2.5">
              <span className="text-tint">
                <Icon name={icon} sizePx={20} />
              </span>
              {title}
            </h2>
            <p className="mt-1.5 text-ink-2">{text}</p>
          </li>
        ))}
      </ol>
      <p className="mt-10 max-w-prose text-sm text-ink-3">
        Instruments at a bench tell species apart. They do not decide by numbers alone whether a stone is natural or treated; where the bench cannot decide, a report from here says so.
      </p>
    </PublicShell>
  );
}
