import type { Metadata, Viewport } from "next";
import { cookies } from "next/headers";
import type { ReactNode } from "react";
import { fontVariables } from "@/app/fonts";
import "@/app/globals.css";
import { LIGHT_COOKIE, lightAttribute, readLight } from "@/components/light";
import { LiveStatus } from "@/components/ui/live-status";
import { requestCtx } from "@/lib/auth/request-ctx";
import { listAnd } from "@/lib/format/words";
import { listProgrammes } from "@/lib/workflow/programme/queries";
import { BottomBar } from "./chrome/bottom-bar";
import { StyleNonce } from "./chrome/style-nonce";
import { TopBar } from "./chrome/top-bar";

export const metadata: Metadata = { title: { default: "Flight line · Greenarc", template: "%s · Greenarc" } };

export const viewport: Viewport = {
  width: "device-width",
  initialScale: 1,
  viewportFit: "cover",
  themeColor: [
    { media: "(prefers-color-scheme: light)", color: "#12372b" },
    { media: "(prefers-color-scheme: dark)", color: "#0a2219" },
  ],
};

export default async function DeskLayout({ children }: { children: ReactNode }) {
  const [{ db, actor }, jar] = await Promise.all([requestCtx(), cookies()]);
  const light = readLight(jar.get(LIGHT_COOKIE)?.value);
  const programmes = listProgrammes(db, actor).map(({ id, name, type }) => ({ id, name, aircraft: type }));
  return (
    <html lang="en" className={fontVariables} {...lightAttribute(light)}>
      <body className="flex flex-col">
        <a href="#content" className="sr-only focus:not-sr-only focus:absolute focus:z-50 focus:bg-sheet focus:p-4">
          Skip to the content
        </a>
        <StyleNonce />
        <LiveStatus>
          <TopBar programmes={programmes} person={{ name: actor.name, roles: listAnd(actor.roles) }} light={light} />
          <div id="content" className="flex grow flex-col pb-24 desk:pb-0">
            {children}
          </div>
          <BottomBar programmes={programmes} roles={actor.roles} />
        </LiveStatus>
      </body>
    </html>
  );
}
