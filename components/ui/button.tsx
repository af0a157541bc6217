import { Slot } from "radix-ui";
import type { ComponentProps } from "react";
import { classNames } from "./class-names";

export type ButtonVariant = "main" | "outline" | "quiet" | "danger";

const SHAPE =
  "inline-flex min-h-14 items-center justify-center gap-2 rounded-md px-4 text-center font-bold transition-colors duration-100 hand:min-h-11 " +
  "disabled:cursor-not-allowed disabled:opacity-60 aria-disabled:cursor-not-allowed aria-disabled:opacity-60";

const VARIANT: Record<ButtonVariant, string> = {
  main: "border border-spine-edge bg-spine text-spine-ink hover:not-disabled:bg-ink hover:not-disabled:text-sheet",
  outline: "border border-ink bg-sheet text-ink hover:not-disabled:bg-wash-grey",
  quiet: "border border-transparent font-normal text-ink underline decoration-1 underline-offset-3 hover:not-disabled:bg-wash-grey",
  danger: "border border-ink-red bg-sheet text-ink-red hover:not-disabled:bg-wash-red",
};

/** For links and menu triggers that wear a button's shape. */
export function buttonClass(variant: ButtonVariant = "outline", className?: string): string {
  return classNames(SHAPE, VARIANT[variant], className);
}

/** One `main` button a view; the rest are outlined in ink. */
export function Button({
  variant = "outline",
  asChild = false,
  className,
  type = "button",
  ...rest
}: ComponentProps<"button"> & { variant?: ButtonVariant; asChild?: boolean }) {
  if (asChild) return <Slot.Root className={buttonClass(variant, className)} {...rest} />;
  return <button type={type} className={buttonClass(variant, className)} {...rest} />;
}
