import { classNames } from "@/components/ui/class-names";
import { arcPath, onDial } from "./gauge/geometry";

const CENTRE = { x: 16, y: 17 };

/** A small arc dial: normal, caution, the red radial, and a needle in the green. Colours are fixed, as on an instrument's face. */
export function BrandMark({ className }: { className?: string }) {
  const tip = onDial(-38, 8.5, CENTRE);
  const radial = [onDial(112, 8.5, CENTRE), onDial(112, 14.5, CENTRE)] as const;
  return (
    <svg viewBox="0 0 32 32" aria-hidden="true" className={classNames("size-7", className)} fill="none">
      <path d={arcPath(-120, 42, 12, CENTRE)} stroke="#5fbf8b" strokeWidth="4" />
      <path d={arcPath(48, 100, 12, CENTRE)} stroke="#e3b23c" strokeWidth="4" />
      <path
        d={`M${radial[0].x.toFixed(2)} ${radial[0].y.toFixed(2)}L${radial[1].x.toFixed(2)} ${radial[1].y.toFixed(2)}`}
        stroke="#f08070"
        strokeWidth="3.4"
      />
      <path
        d={`M${CENTRE.x} ${CENTRE.y}L${tip.x.toFixed(2)} ${tip.y.toFixed(2)}`}
        stroke="#e9f1ea"
        strokeWidth="2.6"
        strokeLinecap="round"
      />
      <circle cx={CENTRE.x} cy={CENTRE.y} r="2.6" fill="#e9f1ea" />
    </svg>
  );
}

/** Stands on the dark spine. */
export function Brand({ className }: { className?: string }) {
  return (
    <span className={classNames("inline-flex items-center gap-2.5 font-bold text-lg text-spine-ink", className)}>
      <BrandMark />
      Greenarc
    </span>
  );
}
