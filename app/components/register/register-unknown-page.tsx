import { RegisterDocument } from "./register-document.tsx";

/** Asks for a code, and says why the last one led nowhere. */
export function RegisterUnknownPage({ typed, reason }: { typed: string; reason: "ask" | "malformed" | "unknown" | "tooMany"; }) {
  return (
    <RegisterDocument title="Check a report · Isogyre" isIndexed={reason === "ask"}>
      <main>
        <h1>Check a report</h1>
        {reason === "malformed" ? (
          <div className="state bad" role="alert">
            <div>
              <b>This is not a report code</b>
              <p>A code has 16 letters and digits in four groups, and the last one checks the others. Compare it with the report, character by character.</p>
            </div>
          </div>
        ) : null}
        {reason === "unknown" ? (
          <div className="state bad" role="alert">
            <div>
              <b>The register does not know this code</b>
              <p>No report with this code was issued here. Compare it with the report; if it is the same, do not rely on the document and ask the laboratory.</p>
            </div>
          </div>
        ) : null}
        {reason === "tooMany" ? (
          <div className="state care" role="alert">
            <div>
              <b>Too many questions in a short time</b>
              <p>The register answers sixty a minute from one address. Wait a minute and ask again.</p>
            </div>
          </div>
        ) : null}
        <form method="get" action="/v">
          <label htmlFor="code">Code on the report</label>
          <input id="code" name="code" defaultValue={typed} autoComplete="off" autoCapitalize="characters" spellCheck={false} maxLength={40} placeholder="XXXX-XXXX-XXXX-XXXX" required />
          <button>Look it up</button>
        </form>
        <p className="small">Or scan the square on the report with a telephone. Dashes and capitals do not matter.</p>
        <div className="box">
          Have the PDF? <a href="/check">Check it against the register</a>
          <br />
          <span className="small">The file stays on your device.</span>
        </div>
      </main>
    </RegisterDocument>
  );
}
