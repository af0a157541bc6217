"use client";
import { ChevronDown } from "lucide-react";
import Link from "next/link";
import type { Light } from "@/components/light";
import { LightMenuItems } from "@/components/light-switch";
import {
  DropdownMenu,
  DropdownMenuContent,
  DropdownMenuItem,
  DropdownMenuSeparator,
  DropdownMenuTrigger,
} from "@/components/ui/dropdown-menu";
import { leave } from "./leave";

export type PersonLabel = { name: string; roles: string };

export function PersonMenu({ person, light }: { person: PersonLabel; light: Light }) {
  return (
    <DropdownMenu modal={false}>
      <DropdownMenuTrigger className="inline-flex min-h-11 items-center gap-2 rounded-md px-3 text-sm text-spine-ink hover:bg-spine-ink/15">
        <span className="text-end leading-tight">
          <span className="block font-bold">{person.name}</span>
          <span className="block">{person.roles}</span>
        </span>
        <ChevronDown aria-hidden="true" className="size-4" />
      </DropdownMenuTrigger>
      <DropdownMenuContent align="end">
        <DropdownMenuItem asChild>
          <Link href="/account">Account and sign-ins</Link>
        </DropdownMenuItem>
        <DropdownMenuItem asChild>
          <Link href="/team">Team</Link>
        </DropdownMenuItem>
        <DropdownMenuSeparator />
        <LightMenuItems initial={light} />
        <DropdownMenuSeparator />
        <DropdownMenuItem onSelect={leave}>Sign out</DropdownMenuItem>
      </DropdownMenuContent>
    </DropdownMenu>
  );
}
