"use client";
import { AlertDialog as Radix } from "radix-ui";
import type { ReactNode } from "react";
import { buttonClass } from "./button";

/** Asks before something that cannot be taken back; focus starts on the way out. */
export function AlertDialog({
  trigger,
  title,
  description,
  confirm,
  cancel = "Keep it as it is",
  onConfirm,
  danger = false,
  children,
}: {
  trigger: ReactNode;
  title: string;
  description: string;
  confirm: string;
  cancel?: string;
  onConfirm: () => void;
  danger?: boolean;
  children?: ReactNode;
}) {
  return (
    <Radix.Root>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-[rgb(0_0_0/0.5)]" />
        <Radix.Content className="-translate-x-1/2 -translate-y-1/2 fixed top-1/2 left-1/2 z-50 flex max-h-[90dvh] w-[min(30rem,calc(100vw-2rem))] flex-col gap-4 overflow-y-auto rounded-lg border border-ink bg-sheet p-5 text-ink">
          <div>
            <Radix.Title className="font-bold text-lg">{title}</Radix.Title>
            <Radix.Description className="mt-1 text-ink-soft">{description}</Radix.Description>
          </div>
          {children}
          <div className="flex flex-col-reverse gap-3 hand:flex-row hand:justify-end">
            <Radix.Cancel className={buttonClass("outline")}>{cancel}</Radix.Cancel>
            <Radix.Action className={buttonClass(danger ? "danger" : "main")} onClick={onConfirm}>
              {confirm}
            </Radix.Action>
          </div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
