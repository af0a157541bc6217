"use client";
import { Tooltip as Radix } from "radix-ui";
import type { ReactNode } from "react";

/** A short word on an icon. Nothing a person needs may stand here alone: touch has no hover. */
export function Tooltip({ text, children }: { text: string; children: ReactNode }) {
  return (
    <Radix.Provider delayDuration={300}>
      <Radix.Root>
        <Radix.Trigger asChild>{children}</Radix.Trigger>
        <Radix.Portal>
          <Radix.Content sideOffset={6} className="z-50 max-w-72 rounded-sm bg-ink px-3 py-2 text-paper text-sm">
            {text}
          </Radix.Content>
        </Radix.Portal>
      </Radix.Root>
    </Radix.Provider>
  );
}
