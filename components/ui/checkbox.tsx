import type { ComponentProps, ReactNode } from "react";
import { classNames } from "./class-names";

/** A tick box with its words; the whole line is the target. */
export function Checkbox({
  label,
  note,
  className,
  ...rest
}: Omit<ComponentProps<"input">, "type"> & { label: ReactNode; note?: ReactNode }) {
  return (
    <label className={classNames("flex min-h-14 items-center gap-3 hand:min-h-11", className)}>
      <input type="checkbox" className="size-6 shrink-0 rounded-sm accent-spine hand:size-5" {...rest} />
      <span>
        {label}
        {note ? <span className="block text-ink-soft text-sm">{note}</span> : null}
      </span>
    </label>
  );
}
