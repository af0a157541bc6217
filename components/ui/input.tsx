import type { ComponentProps } from "react";
import { classNames } from "./class-names";

export const CONTROL =
  "w-full rounded-md border border-control bg-sheet px-3 text-ink min-h-14 hand:min-h-11 " +
  "aria-invalid:border-2 aria-invalid:border-arc-red disabled:cursor-not-allowed disabled:bg-paper disabled:text-ink-soft [&[readonly]]:bg-paper";

export function Input({ className, ...rest }: ComponentProps<"input">) {
  return <input className={classNames(CONTROL, className)} {...rest} />;
}

/** A figure read off a gauge: large, and the phone brings its number keys. */
export function FigureInput({ className, ...rest }: ComponentProps<"input">) {
  return (
    <input
      inputMode="decimal"
      autoComplete="off"
      className={classNames(
        "w-full rounded-md border-2 border-ink bg-sheet px-4 font-bold text-figure text-ink h-14 aria-invalid:border-arc-red [&[readonly]]:bg-paper",
        className,
      )}
      {...rest}
    />
  );
}
