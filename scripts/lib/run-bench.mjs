import { buildIfStale } from "./build-app.mjs";
import { install } from "./install.mjs";
import { fail, root } from "./project.mjs";
import { runNode } from "./run-command.mjs";

process.chdir(root);
await install();
await buildIfStale().catch((error) => fail(error.message));
process.exit(await runNode(["--import", "tsx", "scripts/measure-pages.ts"]));
