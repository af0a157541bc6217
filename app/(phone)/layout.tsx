import type { Metadata, Viewport } from "next";
import type { ReactNode } from "react";
import { b612 } from "@/app/fonts";
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

/** Static for everybody: nothing here may depend on who asks, or the kept page and its policy would disagree. */
export default function PhoneLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" className={b612.variable}>
      <body>
        {children}
        <KeepShell />
      </body>
    </html>
  );
}
