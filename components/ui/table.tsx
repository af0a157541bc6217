import type { ComponentProps, ReactNode } from "react";
import { classNames } from "./class-names";

/** A ruled table. Wider than its place it scrolls by itself, by touch and by key, and the page stays still. */
export function Table({ label, className, children, ...rest }: ComponentProps<"table"> & { label: string }) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a scrolling region must be reachable by key.
    // biome-ignore lint/a11y/useSemanticElements: a fieldset holds controls, this a table.
    <div role="group" aria-label={label} tabIndex={0} className="relative max-w-full overflow-x-auto">
      <table className={classNames("w-full border-collapse", className)} {...rest}>
        <caption className="sr-only">{label}</caption>
        {children}
      </table>
    </div>
  );
}

export function TableHead({ children }: { children: ReactNode }) {
  return (
    <thead>
      <tr className="border-ink border-b-[1.5px] text-ink-soft text-sm">{children}</tr>
    </thead>
  );
}

type Align = { figures?: boolean };

export function HeadCell({ figures = false, className, ...rest }: ComponentProps<"th"> & Align) {
  return (
    <th scope="col" className={classNames("px-3 py-2 align-bottom first:ps-0 last:pe-0", figures && "text-end", className)} {...rest} />
  );
}

export function Row({ className, ...rest }: ComponentProps<"tr">) {
  return <tr className={classNames("border-rule border-b align-baseline", className)} {...rest} />;
}

export function Cell({ figures = false, className, ...rest }: ComponentProps<"td"> & Align) {
  return <td className={classNames("px-3 py-2.5 first:ps-0 last:pe-0", figures && "whitespace-nowrap text-end", className)} {...rest} />;
}

/** The cell that names its row. */
export function RowHead({ className, ...rest }: ComponentProps<"th">) {
  return <th scope="row" className={classNames("px-3 py-2.5 text-start font-normal first:ps-0", className)} {...rest} />;
}
