import type { ReactNode } from "react";

export function PageHeader({
  title,
  lead,
  badge,
  actions,
}: {
  title: ReactNode;
  lead?: ReactNode;
  badge?: ReactNode;
  actions?: ReactNode;
}) {
  return (
    <header className="flex flex-wrap items-start justify-between gap-x-6 gap-y-4 pb-6">
      <div className="max-w-prose">
        <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
          <h1 className="font-bold text-2xl">{title}</h1>
          {badge}
        </div>
        {lead ? <div className="mt-1 text-ink-soft">{lead}</div> : null}
      </div>
      {actions ? <div className="flex flex-wrap items-center gap-3">{actions}</div> : null}
    </header>
  );
}

/** A part of a page under an ink line, with its heading and what it is about. */
export function Section({
  id,
  title,
  lead,
  aside,
  children,
}: {
  id: string;
  title: string;
  lead?: ReactNode;
  aside?: ReactNode;
  children: ReactNode;
}) {
  return (
    <section id={id} aria-labelledby={`${id}-title`} className="border-ink border-t-[1.5px] pt-4 pb-10">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1 pb-3">
        <h2 id={`${id}-title`} className="font-bold text-xl">
          {title}
        </h2>
        {aside ? <div className="text-ink-soft text-sm">{aside}</div> : null}
      </div>
      {lead ? <p className="max-w-prose pb-3 text-ink-soft">{lead}</p> : null}
      {children}
    </section>
  );
}

/** Terms and what stands for them, two columns where there is room. */
export function Facts({ items, columns = 2 }: { items: { term: string; value: ReactNode }[]; columns?: 1 | 2 }) {
  return (
    <dl className={columns === 1 ? "grid grid-cols-1" : "grid grid-cols-1 gap-x-8 hand:grid-cols-2"}>
      {items.map(({ term, value }) => (
        <div key={term} className="flex items-baseline justify-between gap-4 border-rule border-b py-2">
          <dt className="shrink-0 text-ink-soft">{term}</dt>
          <dd className="min-w-0 text-end">{value}</dd>
        </div>
      ))}
    </dl>
  );
}
