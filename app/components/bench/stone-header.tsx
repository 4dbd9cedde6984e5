import { Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Steps, type Step } from "#app/components/ui/steps.tsx";
import { goodsStateNames, type ExaminationState, type GoodsState } from "#app/domain/stone-state.ts";
import { formatWeekdayDate } from "#app/domain/working-days.ts";

export type StoneHead = Readonly<{
  code: string;
  sequence: number;
  stoneCount: number;
  description: string;
  state: ExaminationState;
  goodsState: GoodsState;
  place: string;
  holder: string | null;
  weightText: string;
  itemMass: string;
  isMounted: boolean;
  isValuationOrdered: boolean;
  dueOn: string;
  client: string;
  clientRef: string;
  takeInNumber: string;
  photoRef: string | null;
}>;

type StoneHeaderProps = { stone: StoneHead; labSlug: string; checkName: string; size?: string; title?: string; actions?: React.ReactNode };

/** Which stone this is, whose, how large, where, and how far: the same above each of its pages. */
export function StoneHeader({ stone, labSlug, checkName, size, title, actions }: StoneHeaderProps) {
  const base = `/lab/${labSlug}`;
  const itemCode = stone.code.slice(0, stone.code.lastIndexOf("-"));
  const mass = stone.weightText ? `${stone.weightText} ct` : stone.isMounted ? "mounted" : "";
  return (
    <PageHeader
      picture={
        stone.photoRef ? (
          <img src={`${base}/photos/${stone.photoRef}/thumbnail`} alt={`Photograph of ${stone.code}`} width={92} height={92} className="size-23 rounded-lg border border-rule-2 object-cover" />
        ) : undefined
      }
      eyebrow={
        <>
          {title ? <Link to={`${base}/stones/${stone.code}`} className="text-ink-3">{`${itemCode} · ${stone.sequence}`}</Link> : itemCode}
          {title ? "" : ` · stone ${stone.sequence}${stone.stoneCount > 1 && !title ? ` of ${stone.stoneCount}` : ""}`}
        </>
      }
      title={title ?? `${stone.description}${mass ? `, ${mass}` : ""}`}
      note={title ? `${stone.description}${mass ? `, ${mass}` : ""}` : undefined}
      meta={[
        { name: "Client", value: <Link to={`${base}/clients/${stone.clientRef}`} className="text-ink-2 decoration-rule-2 hover:text-tint">{stone.client}</Link> },
        { name: "Size", value: size ?? "" },
        { name: stone.isMounted ? "Weight with its setting" : "", value: stone.isMounted ? <span className="font-mono">{stone.itemMass}</span> : "" },
        { name: "Due", value: formatWeekdayDate(stone.dueOn, { withYear: false }) },
        {
          name: "Custody",
          value: (
            <Link to={`${base}/take-ins/${stone.takeInNumber}`} className="text-ink-2 decoration-rule-2 hover:text-tint">
              {stone.goodsState === "released" ? goodsStateNames.released : [stone.place, stone.holder].filter(Boolean).join(", ")}
            </Link>
          ),
        },
      ]}
      actions={
        <>
          <Steps label="How far this stone is" steps={stepsOf(stone, checkName)} />
          {actions}
        </>
      }
    />
  );
}

function stepsOf({ state, isValuationOrdered }: StoneHead, checkName: string): Step[] {
  if (state === "declined" || state === "cancelled") return [{ label: "Taken in", state: "done" }, { label: state === "declined" ? "Declined" : "Cancelled", state: "now" }];
  const labels = ["Taken in", "On the bench", checkName, isValuationOrdered ? "Valued" : "Authorised", "Issued"];
  const now = { received: 0, examining: 1, returned: 1, referred: 1, concluded: 2, checked: 3, authorised: 4, issued: 5 }[state];
  return labels.map((label, at) => ({ label: at === 1 && state === "referred" ? "Referred" : label, state: at < now ? "done" : at === now ? "now" : "ahead" }));
}
