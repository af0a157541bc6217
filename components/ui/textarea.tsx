import type { ComponentProps } from "react";
import { classNames } from "./class-names";
import { CONTROL } from "./input";

export function Textarea({ className, rows = 4, ...rest }: ComponentProps<"textarea">) {
  return <textarea rows={rows} className={classNames(CONTROL, "py-2", className)} {...rest} />;
}
