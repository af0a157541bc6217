"use client";
import { Monitor, Moon, Sun } from "lucide-react";
import { useEffect, useState } from "react";
import { DropdownMenuLabel, DropdownMenuRadioGroup, DropdownMenuRadioItem } from "@/components/ui/dropdown-menu";
import { LIGHT_COOKIE, LIGHT_WORDS, LIGHTS, type Light, readLight } from "./light";

const ICON = { system: Monitor, day: Sun, ramp: Moon } as const;
const YEAR_S = 31_536_000;

function useLight(initial: Light): [Light, (light: Light) => void] {
  const [light, setLight] = useState(initial);
  // Another switch on the page may have been used since it was rendered.
  useEffect(() => setLight(readLight(document.documentElement.dataset.light)), []);
  const choose = (next: Light) => {
    setLight(next);
    if (next === "system") delete document.documentElement.dataset.light;
    else document.documentElement.dataset.light = next;
    // biome-ignore lint/suspicious/noDocumentCookie: cookieStore is missing in some of the browsers in use.
    document.cookie = `${LIGHT_COOKIE}=${next}; path=/; max-age=${YEAR_S}; samesite=lax`;
  };
  return [light, choose];
}

/** Three buttons in a row, for a drawer or a foot. */
export function LightSwitch({ initial }: { initial: Light }) {
  const [light, choose] = useLight(initial);
  return (
    <fieldset className="inline-grid max-w-full grid-cols-3 rounded-md border border-control">
      <legend className="sr-only">Light</legend>
      {LIGHTS.map((each) => {
        const Icon = ICON[each];
        return (
          <button
            key={each}
            type="button"
            aria-pressed={light === each}
            onClick={() => choose(each)}
            className="inline-flex min-h-11 items-center justify-center gap-x-2 whitespace-nowrap rounded-sm px-3 max-hand:min-h-14 max-hand:flex-col max-hand:px-2 aria-pressed:bg-ink aria-pressed:text-paper"
          >
            <Icon aria-hidden="true" className="size-4" />
            {LIGHT_WORDS[each]}
          </button>
        );
      })}
    </fieldset>
  );
}

/** The same choice inside a menu. */
export function LightMenuItems({ initial }: { initial: Light }) {
  const [light, choose] = useLight(initial);
  return (
    <>
      <DropdownMenuLabel>Light</DropdownMenuLabel>
      <DropdownMenuRadioGroup value={light} onValueChange={(value) => choose(readLight(value))}>
        {LIGHTS.map((each) => (
          <DropdownMenuRadioItem key={each} value={each}>
            {LIGHT_WORDS[each]}
          </DropdownMenuRadioItem>
        ))}
      </DropdownMenuRadioGroup>
    </>
  );
}
