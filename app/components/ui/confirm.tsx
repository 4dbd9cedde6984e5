import type { ReactNode } from "react";
import { buttonLook } from "./button.tsx";
import { Disclosure } from "./disclosure.tsx";
import { Icon } from "./icon.tsx";

/** A step that should not happen by a slip: opened first, then confirmed by the button among `children`. Works without script. */
export function Confirm({ summary, children, tone = "danger" }: { summary: string; children: ReactNode; tone?: "danger" | "quiet" }) {
  const isDanger = tone === "danger";
  return (
    <Disclosure
      className="group no-print"
      summaryClassName={buttonLook({ look: isDanger ? "quietDanger" : "quiet" })}
      summary={
        <>
          {summary}
          <span className="transition-transform group-open:rotate-180">
            <Icon name="down" sizePx={14} />
          </span>
        </>
      }
    >
      <div className={`mt-2 rounded-md border bg-sheet p-3.5 ${isDanger ? "border-red" : "border-rule-2"}`}>{children}</div>
    </Disclosure>
  );
}
