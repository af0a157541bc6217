"use client";
import { Popover as Radix } from "radix-ui";
import type { ComponentProps } from "react";
import { classNames } from "./class-names";

export const Popover = Radix.Root;
export const PopoverTrigger = Radix.Trigger;
export const PopoverClose = Radix.Close;

export function PopoverContent({ className, sideOffset = 6, ...rest }: ComponentProps<typeof Radix.Content>) {
  return (
    <Radix.Portal>
      <Radix.Content
        sideOffset={sideOffset}
        collisionPadding={8}
        className={classNames("z-50 max-w-[calc(100vw-1rem)] rounded-lg border border-ink bg-sheet p-4 text-ink", className)}
        {...rest}
      />
    </Radix.Portal>
  );
}
