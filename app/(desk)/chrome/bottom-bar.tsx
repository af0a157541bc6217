"use client";
import Link from "next/link";
import { usePathname } from "next/navigation";
import type { Role } from "@/lib/testcards/words";
import { addressOf, placeOf, placesFor } from "./places";
import { type ProgrammeLabel, useProgramme } from "./programme-name";

/** Below 900 px: the three places this role needs most. */
export function BottomBar({ programmes, roles }: { programmes: ProgrammeLabel[]; roles: readonly Role[] }) {
  const here = placeOf(usePathname());
  const current = useProgramme(programmes) ?? programmes[0];
  if (!current) return null;
  return (
    <nav
      aria-label="Most used"
      className="no-print fixed inset-x-0 bottom-0 z-30 border-rule border-t bg-sheet pb-[env(safe-area-inset-bottom)] desk:hidden"
    >
      <ul className="grid grid-cols-3">
        {placesFor(roles).map(({ name, label, icon: Icon }) => (
          <li key={name}>
            <Link
              href={addressOf(name, current.id)}
              aria-current={here === name ? "page" : undefined}
              className="-outline-offset-4 flex min-h-16 flex-col items-center justify-center gap-0.5 border-transparent border-t-3 text-ink-soft aria-[current=page]:border-arc-green aria-[current=page]:font-bold aria-[current=page]:text-ink"
            >
              <Icon aria-hidden="true" className="size-5" />
              {label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
