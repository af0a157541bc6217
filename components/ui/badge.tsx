import type { ReactNode } from "react";
import { classNames } from "./class-names";

export type BadgeTone = "plain" | "blue" | "green" | "yellow" | "red";

const TONE: Record<BadgeTone, string> = {
  plain: "bg-wash-grey text-ink",
  blue: "bg-wash-blue text-arc-blue",
  green: "bg-wash-green text-ink-green",
  yellow: "bg-wash-yellow text-ink-yellow",
  red: "bg-wash-red text-ink-red",
};

/** A state in a word. Verdicts have a mark of their own: `components/gauge/verdict-mark`. */
export function Badge({ tone = "plain", className, children }: { tone?: BadgeTone; className?: string; children: ReactNode }) {
  return (
    <span
      className={classNames(
        "inline-flex items-center gap-1.5 whitespace-nowrap rounded-sm px-2 py-0.5 font-bold text-sm",
        TONE[tone],
        className,
      )}
    >
      {children}
    </span>
  );
}
