import type { ReactNode } from "react";
import { formatNumber, ownDecimals } from "@/lib/format/number";
import { place, type Span, ticks } from "./geometry";

/** Marks and figures along a horizontal scale, for drawings that share an arc strip's length. */
export function Scale({ scale, length, y, most = 6 }: { scale: Span; length: number; y: number; most?: number }) {
  return (
    <g>
      {ticks(scale, most).map((value) => {
        const { at } = place(value, scale, length);
        return (
          <g key={value}>
            <line x1={at} x2={at} y1={y} y2={y + 5} strokeWidth="1" className="stroke-ink-soft" />
            <text x={at} y={y + 19} textAnchor="middle" className="plot-text">
              {formatNumber(value, ownDecimals(value))}
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** What the marks on an arc strip mean. */
export function StripKey() {
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-ink-soft text-sm">
      <KeyItem words="on the gauge">
        <path d="M2 3H14L8 13Z" strokeWidth="2" className="fill-sheet stroke-ink" />
      </KeyItem>
      <KeyItem words="true">
        <path d="M2 3H14L8 13Z" className="fill-ink" />
      </KeyItem>
      <KeyItem words="hot day">
        <path d="M8 1L14 8L8 15L2 8Z" className="fill-ink" />
      </KeyItem>
      <KeyItem words="placard">
        <line x1="8" x2="8" y1="1" y2="15" strokeWidth="4" className="stroke-arc-red" />
      </KeyItem>
      <KeyItem words="card limit">
        <line x1="8" x2="8" y1="1" y2="15" strokeWidth="2" className="stroke-ink" />
      </KeyItem>
      <KeyItem words="abort">
        <line x1="8" x2="8" y1="1" y2="15" strokeWidth="2" strokeDasharray="3 2" className="stroke-ink" />
      </KeyItem>
    </ul>
  );
}

function KeyItem({ words, children }: { words: string; children: ReactNode }) {
  return (
    <li className="inline-flex items-center gap-1.5">
      <svg viewBox="0 0 16 16" aria-hidden="true" className="size-4">
        {children}
      </svg>
      {words}
    </li>
  );
}
