import type { JudgedParcel } from "#app/features/parcels/judge-parcel.ts";

type ParcelSummaryProps = { main: JudgedParcel["main"]; rowCount: number; oddRows: readonly number[]; isBusy?: boolean };

/** What the parcel mostly is, and which of its rows stand apart. */
export function ParcelSummary({ main, rowCount, oddRows, isBusy = false }: ParcelSummaryProps) {
  return (
    <div role="status" className="grid gap-1">
      <p>
        {rowCount} {rowCount === 1 ? "row" : "rows"}.{" "}
        {main ? (
          <>
            Mostly <strong>{main.name}</strong>: the likeliest in {main.rowCount}.
          </>
        ) : isBusy ? (
          "Ranking …"
        ) : (
          "Nothing in them says what they are."
        )}
      </p>
      {oddRows.length > 0 ? (
        <p className="text-straw">
          Stand apart: {oddRows.length === 1 ? "row" : "rows"} {oddRows.slice(0, 30).join(", ")}
          {oddRows.length > 30 ? " and more" : ""}.
        </p>
      ) : main && !isBusy ? (
        <p className="text-ink-2">No row stands apart.</p>
      ) : null}
    </div>
  );
}

/** How rows are told to stand apart, for whoever asks. */
export function HowApart() {
  return (
    <p className="text-xs text-ink-3">
      A row stands apart where its readings give the main species less than 5 %, or where one of its figures lies far from the others: modified z-score by median and median absolute deviation (Iglewicz and Hoaglin, 1993) beyond 3.5, and more than three standard uncertainties off. Five figures at least. Look at
      such a stone again before anything is concluded: a slip, a doublet and a stranger look alike here.
    </p>
  );
}
