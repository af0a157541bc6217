import type { ComponentProps } from "react";
import { classNames } from "./class-names";
import { CONTROL } from "./input";

/** The browser's own list: it works by thumb, by key and without script. */
export function Select({ className, children, ...rest }: ComponentProps<"select">) {
  return (
    <select className={classNames(CONTROL, "pe-8", className)} {...rest}>
      {children}
    </select>
  );
}
