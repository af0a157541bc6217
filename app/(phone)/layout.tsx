import type { Metadata, Viewport } from "next";
import type { ReactNode } from "react";
import { b612 } from "@/app/fonts";
import { LIGHT_COOKIE } from "@/components/light";
import { KeepShell } from "./keep-shell";
import "@/app/globals.css";

export const metadata: Metadata = {
  title: "Debrief · Greenarc",
  manifest: "/debrief.webmanifest",
};

export const viewport: Viewport = {
  width: "device-width",
  initialScale: 1,
  viewportFit: "cover",
  themeColor: [
    { media: "(prefers-color-scheme: light)", color: "#f3f0e7" },
    { media: "(prefers-color-scheme: dark)", color: "#0d1310" },
  ],
};

// The page is the same file for everybody, so the light the person chose is read here, before the first paint.
const setLight = `const light = /(?:^|; )${LIGHT_COOKIE}=(day|ramp)(?:;|$)/.exec(document.cookie); if (light) document.documentElement.dataset.light = light[1];`;

/** Static for everybody: nothing here may depend on who asks, or the kept page and its policy would disagree. */
export default function PhoneLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" className={b612.variable} suppressHydrationWarning>
      <head>
        {/* biome-ignore lint/security/noDangerouslySetInnerHtml: a constant; the build allows it by its hash */}
        <script dangerouslySetInnerHTML={{ __html: setLight }} />
      </head>
      <body>
        {children}
        <KeepShell />
      </body>
    </html>
  );
}
