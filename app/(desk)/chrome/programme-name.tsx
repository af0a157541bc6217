"use client";
import Link from "next/link";
import { useParams } from "next/navigation";

export type ProgrammeLabel = { id: string; name: string; aircraft: string };

export function useProgramme(programmes: ProgrammeLabel[]): ProgrammeLabel | undefined {
  const { programme } = useParams<{ programme?: string }>();
  return programmes.find((each) => each.id === programme);
}

/** "Quillon R2 / Cowl exit and radiator trial", beside the brand. */
export function ProgrammeName({ programmes }: { programmes: ProgrammeLabel[] }) {
  const current = useProgramme(programmes);
  if (!current) return null;
  return (
    <p className="min-w-0 truncate border-spine-ink/30 hand:border-s hand:ps-4">
      {current.name.startsWith(current.aircraft) ? null : (
        <>
          <span className="max-desk:sr-only">{current.aircraft}</span>
          <span aria-hidden="true" className="px-2 max-desk:hidden">
            /
          </span>
        </>
      )}
      <Link href={`/programmes/${current.id}`} className="font-bold hover:underline">
        {current.name}
      </Link>
    </p>
  );
}
