import { CircleAlert } from "lucide-react";

/** What the whole form has to say, read out as it appears. */
export function FormMessage({ message, done }: { message: string | null; done?: string | undefined }) {
  return (
    <div aria-live="polite">
      {message ? (
        <p role="alert" className="flex items-start gap-2 rounded-md bg-wash-red px-4 py-3 text-ink-red">
          <CircleAlert aria-hidden="true" className="mt-0.5 size-5 shrink-0" />
          {message}
        </p>
      ) : null}
      {!message && done ? <p className="rounded-md bg-wash-green px-4 py-3 text-ink-green">{done}</p> : null}
    </div>
  );
}
