import { existsSync } from "node:fs";
import { dirname, join, parse } from "node:path";

const MARK = join("fonts", "b612-latin-400-normal.woff");

function* upwards(from: string): Generator<string> {
  const { root } = parse(from);
  for (let at = from; ; at = dirname(at)) {
    yield at;
    if (at === root) return;
  }
}

/**
 * The folder of the checkout, wherever the process was started: bundled server code no longer stands beside its files, so it is
 * searched for upwards from the working folder and from the script that node was given.
 */
export function projectFolder(): string {
  const starts = [process.cwd(), ...(process.argv[1] ? [dirname(process.argv[1])] : [])];
  for (const start of starts) for (const folder of upwards(start)) if (existsSync(join(folder, MARK))) return folder;
  throw new Error(`The typeface ${MARK} was not found above ${starts.join(" or ")}. Start Greenarc from its own folder.`);
}
