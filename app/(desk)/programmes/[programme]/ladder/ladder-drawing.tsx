import { classNames } from "@/components/ui/class-names";
import type { Rung } from "./series-ladder";

const BAR: Record<Rung["state"], string> = {
  cleared: "border-arc-green border-solid",
  next: "border-ink border-dashed",
  later: "border-rule border-solid",
  held: "border-arc-red border-dotted",
};

/** Two rails and a rung a step, the highest at the top as one climbs. */
export function LadderDrawing({ label, rungs }: { label: string; rungs: Rung[] }) {
  const top = [...rungs].reverse();
  return (
    <ol reversed aria-label={label} className="max-w-3xl">
      {top.map((rung, i) => (
        <li
          key={rung.key}
          className={classNames(
            "grid grid-cols-[4.5rem_2rem_1fr] items-center gap-x-3 hand:grid-cols-[8rem_2rem_1fr_auto]",
            rung.state === "later" && "text-ink-soft",
            rung.state === "next" && "font-bold",
          )}
        >
          <span aria-hidden="true" className="flex h-full min-h-12 items-center self-stretch border-rule border-x-2">
            <span className={classNames("w-full border-t-6", BAR[rung.state])} />
          </span>
          <span className="text-end">{top.length - i}</span>
          <span className="py-2">{rung.name}</span>
          <span
            className={classNames(
              "max-hand:col-start-3 max-hand:-mt-3 max-hand:pb-2 hand:text-end",
              rung.state !== "next" && "text-ink-soft",
            )}
          >
            {rung.state === "held" ? <strong className="text-ink-red">{rung.words}</strong> : rung.words}
          </span>
        </li>
      ))}
    </ol>
  );
}
