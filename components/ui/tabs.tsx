"use client";
import { Tabs as Radix } from "radix-ui";
import type { ComponentProps } from "react";
import { classNames } from "./class-names";

export const Tabs = Radix.Root;

export function TabsList({ className, ...rest }: ComponentProps<typeof Radix.List>) {
  return <Radix.List className={classNames("flex gap-1 overflow-x-auto border-rule border-b", className)} {...rest} />;
}

export function TabsTrigger({ className, ...rest }: ComponentProps<typeof Radix.Trigger>) {
  return (
    <Radix.Trigger
      className={classNames(
        "-mb-px min-h-11 whitespace-nowrap rounded-t-lg border border-transparent px-4 text-ink-soft hover:text-ink",
        "data-[state=active]:border-rule data-[state=active]:border-b-sheet data-[state=active]:bg-sheet data-[state=active]:font-bold data-[state=active]:text-ink",
        className,
      )}
      {...rest}
    />
  );
}

export function TabsContent({ className, ...rest }: ComponentProps<typeof Radix.Content>) {
  return <Radix.Content className={classNames("pt-4", className)} {...rest} />;
}
