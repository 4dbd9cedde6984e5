import type { RegisterEntry } from "#app/features/register/ask-register.server.ts";
import { formatCalendarDate } from "#app/domain/calendar-date.ts";
import { withdrawalReasonNames } from "#app/domain/report-state.ts";
import { RegisterDocument } from "./register-document.tsx";

const ticks = { good: "M7.5 12.5l3 3 6-7", care: "M12 7v6m0 3v.5", bad: "M8 8l8 8m0-8l-8 8" } as const;

function StateBox({ tone, title, children }: { tone: keyof typeof ticks; title: string; children: React.ReactNode }) {
  return (
    <div className={`state ${tone}`}>
      <svg viewBox="0 0 24 24" fill="none" stroke="currentColor" strokeWidth="1.8" strokeLinecap="round" strokeLinejoin="round" aria-hidden="true">
        <circle cx="12" cy="12" r="10.5" />
        <path d={ticks[tone]} />
      </svg>
      <div>
        <b>{title}</b>
        <p>{children}</p>
      </div>
    </div>
  );
}

const day = (instant: Date) => formatCalendarDate(instant.toISOString().slice(0, 10));

function StateOf({ entry }: { entry: RegisterEntry }) {
  const version = `version ${entry.view.reportVersion}`;
  if (entry.state === "withdrawn") {
    return (
      <StateBox tone="bad" title="This report has been withdrawn">
        Withdrawn {entry.withdrawnAt ? day(entry.withdrawnAt) : ""} because of {withdrawalReasonNames[entry.withdrawalReason ?? "other"]}. Do not rely on it. Ask the laboratory.
      </StateBox>
    );
  }
  if (entry.state === "superseded") {
    return (
      <StateBox tone="care" title="This report is genuine, but a newer one replaces it">
        Issued {day(entry.issuedAt)}, {version}. Replaced by{" "}
        {entry.supersededByCode ? <a href={`/v/${entry.supersededByCode}`}>{entry.supersededByNumber}</a> : entry.supersededByNumber}. Rely on that one.
      </StateBox>
    );
  }
  return (
    <StateBox tone="good" title="This report is genuine and current">
      Issued {day(entry.issuedAt)}, {version}. Not amended or withdrawn.
    </StateBox>
  );
}

/** What the register says of one report. */
export function RegisterPage({ entry }: { entry: RegisterEntry }) {
  const { view } = entry;
  const rows: Array<[string, string, boolean]> = [
    ["Report", view.reportNumber, true],
    ["Report date", formatCalendarDate(view.reportOn), false],
    ["Weight", view.weight, true],
    ["Dimensions", view.dimensions, true],
    ["Cut", view.cut, false],
    ["Colour", view.colour, false],
    ["Indices", view.indices, true],
    ["Density", view.density, true],
    ["Signed by", view.signedBy, false],
  ];
  return (
    <RegisterDocument title={`${view.reportNumber} · ${view.laboratoryName}`}>
      <main>
        <header>
          <div className="mark" aria-hidden="true">
            {view.laboratoryMark}
          </div>
          <div>
            <p className="lab">{view.laboratoryName}</p>
            <p>report register</p>
          </div>
        </header>
        <StateOf entry={entry} />
        <div className={view.hasPhoto ? "two pic" : "two"}>
          <div>
            <h1>{view.title}</h1>
            {view.statements.map((statement) => (
              <p className="sub" key={statement}>
                {statement}
              </p>
            ))}
            <dl>
              {rows
                .filter(([, value]) => value !== "")
                .map(([label, value, isMono]) => (
                  <div key={label} style={{ display: "contents" }}>
                    <dt>{label}</dt>
                    <dd className={isMono ? "mono" : undefined}>{value}</dd>
                  </div>
                ))}
            </dl>
          </div>
          {view.hasPhoto ? <img src={`/v/${entry.code}/photo.jpg`} width="480" height="480" alt={`Photograph of the stone in report ${view.reportNumber}`} /> : null}
        </div>
        <div className="box">
          Have the PDF? <a href={`/check?code=${entry.code}`}>Check it against the register</a>
          <br />
          <span className="small">The file stays on your device. Only its fingerprint is compared.</span>
        </div>
        <p className="small">
          A valid code proves the document, not the stone: compare the stone with the photograph, weight and measurements. A report describes the stone as it
          was examined on the date shown; it is not a guarantee or an offer to buy.
        </p>
        <p className="small mono">{entry.shownCode}</p>
      </main>
    </RegisterDocument>
  );
}
