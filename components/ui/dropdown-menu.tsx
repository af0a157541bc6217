"use client";
import { Check } from "lucide-react";
import { DropdownMenu as Radix } from "radix-ui";
import type { ComponentProps } from "react";
import { classNames } from "./class-names";

export const DropdownMenu = Radix.Root;
export const DropdownMenuTrigger = Radix.Trigger;
export const DropdownMenuRadioGroup = Radix.RadioGroup;

const ITEM =
  "flex min-h-14 w-full select-none items-center gap-2 rounded-sm px-3 text-start text-ink hand:min-h-11 " +
  "data-[disabled]:opacity-60 data-[highlighted]:bg-wash-grey";

export function DropdownMenuContent({ className, sideOffset = 6, ...rest }: ComponentProps<typeof Radix.Content>) {
  return (
    <Radix.Portal>
      <Radix.Content
        sideOffset={sideOffset}
        collisionPadding={8}
        className={classNames("z-50 min-w-56 rounded-lg border border-ink bg-sheet p-1 text-ink", className)}
        {...rest}
      />
    </Radix.Portal>
  );
}

export function DropdownMenuItem({ className, ...rest }: ComponentProps<typeof Radix.Item>) {
  return <Radix.Item className={classNames(ITEM, className)} {...rest} />;
}

export function DropdownMenuRadioItem({ className, children, ...rest }: ComponentProps<typeof Radix.RadioItem>) {
  return (
    <Radix.RadioItem className={classNames(ITEM, className)} {...rest}>
      <span className="inline-flex size-5 items-center justify-center">
        <Radix.ItemIndicator>
          <Check aria-hidden="true" className="size-4" />
        </Radix.ItemIndicator>
      </span>
      {children}
    </Radix.RadioItem>
  );
}

export function DropdownMenuLabel({ className, ...rest }: ComponentProps<typeof Radix.Label>) {
  return <Radix.Label className={classNames("px-3 pt-2 pb-1 text-ink-soft text-sm", className)} {...rest} />;
}

export function DropdownMenuSeparator() {
  return <Radix.Separator className="my-1 h-px bg-rule" />;
}
