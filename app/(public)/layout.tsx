import type { Metadata, Viewport } from "next";
import { cookies } from "next/headers";
import type { ReactNode } from "react";
import { fontVariables } from "@/app/fonts";
import "@/app/globals.css";
import { Brand } from "@/components/brand";
import { LIGHT_COOKIE, lightAttribute, readLight } from "@/components/light";
import { LightSwitch } from "@/components/light-switch";

export const metadata: Metadata = { title: { default: "Greenarc", template: "%s · Greenarc" } };

export const viewport: Viewport = { width: "device-width", initialScale: 1 };

export default async function PublicLayout({ children }: { children: ReactNode }) {
  const light = readLight((await cookies()).get(LIGHT_COOKIE)?.value);
  return (
    <html lang="en" className={fontVariables} {...lightAttribute(light)}>
      <body className="flex flex-col">
        <header className="on-spine flex min-h-14 items-center bg-spine px-4 hand:px-6">
          <Brand />
        </header>
        <main className="flex grow flex-col">{children}</main>
        <footer className="flex flex-wrap items-center justify-between gap-4 border-rule border-t px-4 py-4 text-ink-soft hand:px-6">
          <p className="max-w-prose text-sm">
            Planning and record aid. Not an approval, not an airworthiness release. The pilot in command decides.
          </p>
          <LightSwitch initial={light} />
        </footer>
      </body>
    </html>
  );
}
