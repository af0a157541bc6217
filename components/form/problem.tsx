/** Why a single action was refused, read out as it appears beside it. */
export function Problem({ text, className = "" }: { text: string | null; className?: string }) {
  return text ? (
    <p role="alert" className={`text-ink-red ${className}`.trimEnd()}>
      {text}
    </p>
  ) : null;
}
