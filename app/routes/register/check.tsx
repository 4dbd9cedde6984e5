import { useId, useState } from "react";
import { useRouteLoaderData } from "react-router";
import { PublicShell } from "#app/components/layout/public-shell.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { describedBy, FieldFrame, inputLook } from "#app/components/ui/field-frame.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { formatRegisterCode, parseRegisterCode } from "#app/domain/register-code.ts";
import { fingerprintOf } from "#app/features/register/compare-fingerprint.ts";
import type { loader as rootLoader } from "#app/root.tsx";
import type { Route } from "./+types/check";

export function loader({ url }: Route.LoaderArgs) {
  const code = parseRegisterCode(url.searchParams.get("code") ?? "");
  return { code: code ? formatRegisterCode(code) : "" };
}

export const meta: Route.MetaFunction = () => [{ title: "Check a PDF · Isogyre" }];

type Verdict = { tone: "green" | "straw" | "red"; title: string; text: string };

async function compare(codeText: string, file: File | undefined): Promise<{ verdict?: Verdict; codeError?: string; fileError?: string }> {
  const code = parseRegisterCode(codeText);
  if (!code) return { codeError: "This is not a report code: it has 16 letters and digits, and the last one checks the others. Compare it with the report." };
  if (!file) return { fileError: "Choose the PDF." };
  if (!globalThis.crypto?.subtle) return { fileError: "This browser computes fingerprints only over a secure connection. Open this page by its https address." };
  const response = await fetch(`/v/${code}/fingerprint.json`).catch(() => undefined);
  if (!response) return { verdict: { tone: "straw", title: "The register could not be reached", text: "Nothing is known about the file yet. Try again when the connection is back." } };
  const answer = (await response.json()) as { found: boolean; sha256?: string; state?: string; reportNumber?: string; userMessage?: string };
  if (response.status === 429) return { verdict: { tone: "straw", title: "Too many questions", text: answer.userMessage ?? "Try again in a minute." } };
  if (!answer.found) return { verdict: { tone: "red", title: "The register does not know this code", text: "Do not rely on the document. Ask the laboratory." } };
  if ((await fingerprintOf(file)) !== answer.sha256) {
    return { verdict: { tone: "red", title: "This is not the file that was issued", text: `It differs from the PDF of report ${answer.reportNumber}. It may have been altered, or saved anew by a program. Ask for the original, and do not rely on this one.` } };
  }
  if (answer.state === "withdrawn") return { verdict: { tone: "red", title: "The very file, but withdrawn", text: `Report ${answer.reportNumber} has been withdrawn. Do not rely on it.` } };
  if (answer.state === "superseded") return { verdict: { tone: "straw", title: "The very file, but replaced", text: `A newer report replaces ${answer.reportNumber}. Look it up in the register.` } };
  return { verdict: { tone: "green", title: "This is the very file that was issued", text: `It is byte for byte the PDF of report ${answer.reportNumber}, which is current.` } };
}

const grounds = { green: "bg-green-bg text-green", straw: "bg-straw-bg text-straw", red: "bg-red-bg text-red" };

export default function CheckRoute({ loaderData }: Route.ComponentProps) {
  const root = useRouteLoaderData<typeof rootLoader>("root");
  const fileId = useId();
  const [result, setResult] = useState<Awaited<ReturnType<typeof compare>>>({});
  const [isComparing, setIsComparing] = useState(false);
  const fileErrors = result.fileError ? [result.fileError] : undefined;
  return (
    <PublicShell room={root?.room ?? "system"}>
      <div className="mx-auto max-w-xl pt-8">
        <h1 className="text-[27px]">Check a PDF against the register</h1>
        <p className="mt-2 text-ink-2">
          Your browser computes the file’s fingerprint (SHA-256) and compares it with the one in the register. The file stays on your device: it is not sent anywhere.
        </p>
        <noscript>
          <p className="mt-4 rounded-md bg-straw-bg px-3.5 py-2.5 text-straw">
            The comparison needs script. Without it, look the code up in the register, or compare the file’s SHA-256 yourself: the register answers it at /v/CODE/fingerprint.json.
          </p>
        </noscript>
        <form
          className="mt-5 grid gap-4"
          method="get"
          action="/v"
          noValidate
          onSubmit={async (event) => {
            event.preventDefault();
            const form = new FormData(event.currentTarget);
            const file = form.get("file");
            setIsComparing(true);
            setResult(await compare(String(form.get("code") ?? ""), file instanceof File && file.size > 0 ? file : undefined));
            setIsComparing(false);
          }}
        >
          <TextField id="code" name="code" label="Code on the report" isMono defaultValue={loaderData.code} autoComplete="off" maxLength={40} errors={result.codeError ? [result.codeError] : undefined} />
          <FieldFrame id={fileId} label="The PDF" isRequired errors={fileErrors}>
            <input id={fileId} name="file" type="file" accept="application/pdf,.pdf" className={inputLook} {...describedBy({ id: fileId, errors: fileErrors })} />
          </FieldFrame>
          <Button disabled={isComparing} className="justify-self-start">
            {isComparing ? "Comparing" : "Compare"}
          </Button>
        </form>
        <div role="status" aria-live="polite" className="mt-5">
          {result.verdict ? (
            <div className={`rounded-[10px] px-4 py-3.5 ${grounds[result.verdict.tone]}`}>
              <p className="font-semibold">{result.verdict.title}</p>
              <p>{result.verdict.text}</p>
            </div>
          ) : null}
        </div>
        <p className="mt-6 text-[13px] text-ink-3">A genuine file proves the document, not the stone: compare the stone with the photograph, weight and measurements.</p>
      </div>
    </PublicShell>
  );
}
