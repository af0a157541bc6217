"use client";
import Link from "next/link";
import { usePathname } from "next/navigation";
import { addressOf, placeOf, TABS } from "./places";

/** The binder's tabs across the top of a programme. */
export function BinderTabs({ programmeId }: { programmeId: string }) {
  const place = placeOf(usePathname());
  const here = place === "ladder" ? "programme" : place;
  return (
    <nav aria-label="Programme" className="no-print border-rule border-b px-6 pt-3 max-desk:hidden">
      <ul className="flex gap-1">
        {TABS.map(({ name, label }) => (
          <li key={name} className="-mb-px">
            <Link
              href={addressOf(name, programmeId)}
              aria-current={here === name ? "page" : undefined}
              className="inline-flex min-h-11 items-center rounded-t-lg border border-transparent px-4 text-ink-soft hover:text-ink aria-[current=page]:border-rule aria-[current=page]:border-b-sheet aria-[current=page]:bg-sheet aria-[current=page]:font-bold aria-[current=page]:text-ink"
            >
              {label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
