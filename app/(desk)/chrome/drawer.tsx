"use client";
import { Menu } from "lucide-react";
import Link from "next/link";
import { usePathname } from "next/navigation";
import { useState } from "react";
import type { Light } from "@/components/light";
import { LightSwitch } from "@/components/light-switch";
import { Button } from "@/components/ui/button";
import { Dialog, DialogContent, DialogTrigger } from "@/components/ui/dialog";
import { leave } from "./leave";
import type { PersonLabel } from "./person-menu";
import { addressOf, PLACES, placeOf } from "./places";
import { type ProgrammeLabel, useProgramme } from "./programme-name";

/** Below 900 px: every place there is, the light, and the way out. */
export function Drawer({ programmes, person, light }: { programmes: ProgrammeLabel[]; person: PersonLabel; light: Light }) {
  const [open, setOpen] = useState(false);
  const path = usePathname();
  const current = useProgramme(programmes) ?? programmes[0];
  const here = placeOf(path);
  const close = () => setOpen(false);
  const line = "flex min-h-14 items-center gap-3 rounded-md px-3 aria-[current=page]:bg-wash-grey aria-[current=page]:font-bold";
  return (
    <Dialog open={open} onOpenChange={setOpen}>
      <DialogTrigger className="inline-flex size-12 shrink-0 items-center justify-center rounded-md hover:bg-spine-ink/15 desk:hidden">
        <Menu aria-hidden="true" className="size-6" />
        <span className="sr-only">Menu</span>
      </DialogTrigger>
      <DialogContent where="side" title={current?.name ?? "Greenarc"} {...(current ? { description: current.aircraft } : {})}>
        <nav aria-label="Places" className="flex flex-col">
          <Link href="/" onClick={close} className={line} aria-current={path === "/" ? "page" : undefined}>
            Flight line
          </Link>
          {PLACES.filter((place) => current || place.name === "team").map(({ name, label, icon: Icon }) => (
            <Link
              key={name}
              href={addressOf(name, current?.id ?? "")}
              onClick={close}
              className={line}
              aria-current={here === name ? "page" : undefined}
            >
              <Icon aria-hidden="true" className="size-5" />
              {label}
            </Link>
          ))}
          <Link href="/account" onClick={close} className={line} aria-current={path === "/account" ? "page" : undefined}>
            Account and sign-ins
          </Link>
        </nav>
        <LightSwitch initial={light} />
        <div className="mt-auto flex flex-col gap-2">
          <p className="text-ink-soft">
            Signed in as {person.name}, {person.roles}
          </p>
          <Button onClick={leave}>Sign out</Button>
        </div>
      </DialogContent>
    </Dialog>
  );
}
