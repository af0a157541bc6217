import { HttpRefusal } from "./http-refusal";

/** A card of forty points is about 200 kB of JSON. */
const MOST_BYTES = 1_000_000;

/** The body as an object; an empty body counts as {}. What it holds is for the use case's schema to say. */
export async function readJson(request: Request): Promise<Record<string, unknown>> {
  const text = await readText(request);
  if (text === "") return {};
  const type = request.headers.get("content-type")?.split(";")[0]?.trim().toLowerCase();
  if (type !== "application/json") throw new HttpRefusal(415, "Wrong type", "Send the body as application/json.");
  let body: unknown;
  try {
    body = JSON.parse(text);
  } catch {
    throw new HttpRefusal(400, "Malformed", "The body is not JSON.");
  }
  if (typeof body !== "object" || body === null || Array.isArray(body))
    throw new HttpRefusal(400, "Malformed", "The body is a JSON object.");
  return body as Record<string, unknown>;
}

/** Counted while it arrives: a length header may be missing or wrong. */
async function readText(request: Request): Promise<string> {
  const tooLarge = () => new HttpRefusal(413, "Too large", `Send at most ${MOST_BYTES / 1000} kB.`);
  if (Number(request.headers.get("content-length") ?? 0) > MOST_BYTES) throw tooLarge();
  if (!request.body) return "";
  const chunks: Uint8Array[] = [];
  let bytes = 0;
  for await (const chunk of request.body as unknown as AsyncIterable<Uint8Array>) {
    bytes += chunk.byteLength;
    if (bytes > MOST_BYTES) throw tooLarge();
    chunks.push(chunk);
  }
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(Buffer.concat(chunks));
  } catch {
    throw new HttpRefusal(400, "Malformed", "The body is not UTF-8.");
  }
}

/** The version a change was made on, from If-Match: a change without it could overwrite what nobody saw. */
export function readIfMatch(request: Request): number {
  const seen = request.headers.get("if-match");
  if (seen === null) throw new HttpRefusal(428, "Condition missing", "Send If-Match with the ETag of what you changed.");
  const match = /^(?:W\/)?"(\d{1,9})"$/.exec(seen.trim());
  if (!match) throw new HttpRefusal(400, "Malformed", 'If-Match is an ETag as it was given, such as "3".');
  return Number(match[1]);
}

/** Idempotency-Key and the digest of what came with it; undefined where none was sent, and each request is then its own. */
export async function readSubmission(request: Request, body: unknown): Promise<{ key: string; bodyDigest: string } | undefined> {
  const key = request.headers.get("idempotency-key")?.trim();
  if (key === undefined) return undefined;
  if (key.length < 8 || key.length > 100)
    throw new HttpRefusal(400, "Malformed", "An Idempotency-Key has 8 to 100 characters, such as a UUID.");
  const text = JSON.stringify([request.method, new URL(request.url).pathname, body]);
  const bytes = new Uint8Array(await crypto.subtle.digest("SHA-256", new TextEncoder().encode(text)));
  return { key, bodyDigest: Array.from(bytes, (byte) => byte.toString(16).padStart(2, "0")).join("") };
}
