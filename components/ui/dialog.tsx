"use client";
import { X } from "lucide-react";
import { Dialog as Radix } from "radix-ui";
import type { ReactNode } from "react";
import { classNames } from "./class-names";

export const Dialog = Radix.Root;
export const DialogTrigger = Radix.Trigger;
export const DialogClose = Radix.Close;

/** `where="side"` is the drawer; "centre" a question or a small form. */
export function DialogContent({
  title,
  description,
  where = "centre",
  className,
  children,
}: {
  title: string;
  description?: string;
  where?: "centre" | "side";
  className?: string;
  children: ReactNode;
}) {
  return (
    <Radix.Portal>
      <Radix.Overlay className="fixed inset-0 z-40 bg-[rgb(0_0_0/0.5)]" />
      <Radix.Content
        {...(description ? {} : { "aria-describedby": undefined })}
        className={classNames(
          "fixed z-50 flex flex-col gap-4 overflow-y-auto border border-ink bg-sheet p-5 text-ink",
          where === "side"
            ? "inset-y-0 start-0 w-[min(20rem,90vw)]"
            : "-translate-x-1/2 -translate-y-1/2 top-1/2 left-1/2 max-h-[90dvh] w-[min(34rem,calc(100vw-2rem))] rounded-lg",
          className,
        )}
      >
        <div className="flex items-start justify-between gap-4">
          <div>
            <Radix.Title className="font-bold text-lg">{title}</Radix.Title>
            {description ? <Radix.Description className="mt-1 text-ink-soft">{description}</Radix.Description> : null}
          </div>
          <Radix.Close className="-me-2 -mt-2 inline-flex size-11 shrink-0 items-center justify-center rounded-md hover:bg-wash-grey">
            <X aria-hidden="true" className="size-5" />
            <span className="sr-only">Close</span>
          </Radix.Close>
        </div>
        {children}
      </Radix.Content>
    </Radix.Portal>
  );
}
