import { classNames } from "@/components/ui/class-names";
import { sentenceCase } from "@/lib/format/words";
import type { Reason, Verdict } from "@/lib/testcards/words";
import { arcPath, onDial } from "./geometry";

const CENTRE = { x: 10, y: 10.5 };
const RADIUS = 7;

const TONE: Record<Verdict, string> = {
  within: "bg-wash-green text-ink-green",
  marginal: "bg-wash-yellow text-ink-yellow",
  exceeded: "bg-wash-red text-ink-red",
  "no verdict": "bg-wash-grey text-ink-soft",
};

/** A dial: needle inside, needle at the end of the arc, needle past the stop; dots and no needle where nothing is judged. */
export function VerdictGlyph({ verdict, className }: { verdict: Verdict; className?: string }) {
  return (
    <svg
      viewBox="0 0 20 20"
      aria-hidden="true"
      className={classNames("size-5 shrink-0", className)}
      fill="none"
      stroke="currentColor"
      strokeWidth="2.2"
    >
      {verdict === "no verdict" ? (
        <path d={arcPath(-120, 120, RADIUS, CENTRE)} strokeDasharray="0.1 4" strokeLinecap="round" strokeWidth="2" />
      ) : (
        <path d={arcPath(-120, 120, RADIUS, CENTRE)} />
      )}
      <Needle verdict={verdict} />
    </svg>
  );
}

function Needle({ verdict }: { verdict: Verdict }) {
  if (verdict === "within") return <path d={`M${CENTRE.x} ${CENTRE.y + 1}V${CENTRE.y - 4.6}`} />;
  if (verdict === "marginal") {
    const tip = onDial(90, RADIUS, CENTRE);
    return <path d={`M${CENTRE.x} ${CENTRE.y}L${tip.x} ${tip.y - 3}V${tip.y + 3}Z`} fill="currentColor" stroke="none" />;
  }
  if (verdict === "exceeded") {
    const tip = onDial(128, RADIUS + 2.4, CENTRE);
    const stop = [onDial(116, RADIUS + 3, CENTRE), onDial(148, RADIUS + 1.6, CENTRE)] as const;
    return (
      <>
        <path d={`M${CENTRE.x} ${CENTRE.y}L${tip.x.toFixed(2)} ${tip.y.toFixed(2)}`} strokeWidth="2.6" />
        <path d={`M${stop[0].x.toFixed(2)} ${stop[0].y.toFixed(2)}L${stop[1].x.toFixed(2)} ${stop[1].y.toFixed(2)}`} strokeWidth="2" />
      </>
    );
  }
  return null;
}

/** Glyph, word, colour, in that order. "No verdict" carries its reason here or in the cell beside it. */
export function VerdictMark({ verdict, reason, className }: { verdict: Verdict; reason?: Reason | null; className?: string }) {
  return (
    <span
      className={classNames(
        "inline-flex items-center gap-1.5 whitespace-nowrap rounded-sm py-0.5 ps-1.5 pe-2.5 font-bold text-sm",
        TONE[verdict],
        className,
      )}
    >
      <VerdictGlyph verdict={verdict} />
      {sentenceCase(verdict)}
      {verdict === "no verdict" && reason ? `: ${reason}` : ""}
    </span>
  );
}
