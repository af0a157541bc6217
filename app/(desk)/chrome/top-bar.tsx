import Link from "next/link";
import { Brand } from "@/components/brand";
import type { Light } from "@/components/light";
import { Drawer } from "./drawer";
import { type PersonLabel, PersonMenu } from "./person-menu";
import { type ProgrammeLabel, ProgrammeName } from "./programme-name";

export function TopBar({ programmes, person, light }: { programmes: ProgrammeLabel[]; person: PersonLabel; light: Light }) {
  return (
    <header className="on-spine no-print flex min-h-14 items-center gap-x-4 bg-spine px-2 text-spine-ink desk:px-6">
      <Drawer programmes={programmes} person={person} light={light} />
      <Link href="/" className="inline-flex rounded-md py-2" title="Flight line">
        <Brand />
      </Link>
      <ProgrammeName programmes={programmes} />
      <div className="ms-auto max-desk:hidden">
        <PersonMenu person={person} light={light} />
      </div>
    </header>
  );
}
