import { readFileSync } from "node:fs";
import { join } from "node:path";
import { type NextRequest, NextResponse } from "next/server";
import { commonHeaders, developmentShellPolicy, hashPolicy, noncePolicy } from "@/lib/http/content-security";

const development = process.env.NODE_ENV === "development";

let shellHashes: string[] | undefined;

/** The hashes of the phone shell's inline scripts, gathered from the built page (see scripts/build.mjs). */
function readShellHashes(): string[] {
  shellHashes ??= (JSON.parse(readFileSync(join(process.cwd(), ".next", "phone-shell.json"), "utf8")) as { scriptHashes: string[] })
    .scriptHashes;
  return shellHashes;
}

/** Every answer gets the security headers; a page also gets its Content-Security-Policy. */
export default function proxy(request: NextRequest): NextResponse {
  const path = request.nextUrl.pathname;
  const shell = path === "/debrief" || path.startsWith("/debrief/");
  let response: NextResponse;
  if (shell) {
    response = NextResponse.next();
    response.headers.set("Content-Security-Policy", development ? developmentShellPolicy() : hashPolicy(readShellHashes()));
  } else {
    const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString("base64");
    const policy = noncePolicy(nonce, development);
    const headers = new Headers(request.headers);
    headers.set("x-nonce", nonce);
    headers.set("x-path", path + request.nextUrl.search); // where to come back to after a sign-in
    headers.set("Content-Security-Policy", policy); // Next reads the nonce for its own scripts here
    response = NextResponse.next({ request: { headers } });
    response.headers.set("Content-Security-Policy", policy);
  }
  const overHttps = request.nextUrl.protocol === "https:" || request.headers.get("x-forwarded-proto") === "https";
  for (const [name, value] of commonHeaders(overHttps)) response.headers.set(name, value);
  return response;
}

export const config = { matcher: ["/((?!_next/static|_next/image).*)"] };
