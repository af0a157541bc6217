import { ForeignOrigin } from "./errors";

const READING = new Set(["GET", "HEAD", "OPTIONS"]);

/** A cookie travels with every request a browser makes, so a change must also name one of our own addresses as its origin. */
export function checkOrigin(request: Request, ownAddress: string | undefined): void {
  if (READING.has(request.method)) return;
  const origin = request.headers.get("origin");
  const own = [ownAddress && new URL(ownAddress).host, request.headers.get("host")];
  if (!origin || !URL.canParse(origin) || !own.includes(new URL(origin).host)) throw new ForeignOrigin();
}
