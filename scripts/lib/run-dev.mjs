import { dirname } from "node:path";
import { prepareDemoData } from "./demo-data.mjs";
import { fillDemoSettings, wantedPort } from "./demo-settings.mjs";
import { install, requireWritable } from "./install.mjs";
import { fail, inRoot, root } from "./project.mjs";
import { runNode } from "./run-command.mjs";
import { requireFreePort } from "./serve.mjs";

const port = wantedPort() ?? fail(`PORT is ${process.env.PORT}; it must be a number from 1 to 65535.`);
process.chdir(root);
await requireFreePort(port);
await install();
fillDemoSettings(port);
requireWritable(dirname(process.env.DATABASE_FILE));
await prepareDemoData(process.env.DATABASE_FILE, { fresh: process.argv.includes("--fresh") });
const next = inRoot("node_modules", "next", "dist", "bin", "next");
process.exit(await runNode([next, "dev", "--hostname", "127.0.0.1", "--port", String(port)]));
