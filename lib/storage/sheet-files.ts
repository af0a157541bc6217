import { randomUUID } from "node:crypto";
import { mkdir, readFile, rename, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { env } from "@/lib/env";

/** A drawn sheet by its key, drawn once. Written beside and renamed, so that nobody reads half a file. */
export async function keptSheet(key: string, draw: () => Promise<Uint8Array>): Promise<Uint8Array> {
  if (!/^[\w.-]{1,200}$/.test(key)) throw new RangeError(`key is ${JSON.stringify(key)}; it must be a plain file name.`);
  const folder = join(env().FILES_DIR, "sheets");
  const file = join(folder, `${key}.pdf`);
  const kept = await readFile(file).catch(() => undefined);
  if (kept) return kept;
  const drawn = await draw();
  await mkdir(folder, { recursive: true });
  const beside = join(folder, `.${randomUUID()}.part`);
  await writeFile(beside, drawn);
  await rename(beside, file);
  return drawn;
}
