import { classNames } from "./class-names";

/** Lines where text is about to stand. The words for a screen reader belong to the page that waits. */
export function Skeleton({ lines = 3, className }: { lines?: number; className?: string }) {
  return (
    <div aria-hidden="true" className={classNames("flex flex-col gap-3", className)}>
      {Array.from({ length: lines }, (_, line) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: identical lines that never move.
        <span key={line} className={classNames("h-4 animate-pulse rounded-sm bg-wash-grey", line % 3 === 2 ? "w-1/2" : "w-full")} />
      ))}
    </div>
  );
}
