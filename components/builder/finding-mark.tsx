import type { FindingSeverity } from "@/lib/testcards/words";

/** A square for "must", an open one for "should": never the verdicts' dials. */
export function FindingMark({ severity }: { severity: FindingSeverity }) {
  return (
    <svg
      viewBox="0 0 20 20"
      className={`mt-0.5 size-5 shrink-0 ${severity === "must" ? "text-arc-red" : "text-ink-yellow"}`}
      role="img"
      aria-label={severity}
    >
      <rect
        x="1.5"
        y="1.5"
        width="17"
        height="17"
        fill={severity === "must" ? "currentColor" : "none"}
        stroke="currentColor"
        strokeWidth="2.5"
      />
      <path d="M10 5v6" stroke={severity === "must" ? "var(--sheet)" : "currentColor"} strokeWidth="2.5" />
      <path d="M10 13v2.5" stroke={severity === "must" ? "var(--sheet)" : "currentColor"} strokeWidth="2.5" />
    </svg>
  );
}
