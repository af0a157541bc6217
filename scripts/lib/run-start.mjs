import { existsSync } from "node:fs";
import { fail, inRoot, root } from "./project.mjs";
import { runNode } from "./run-command.mjs";
import { serve } from "./serve.mjs";

process.chdir(root);
if (!existsSync(inRoot("node_modules", "next"))) fail("Nothing is installed yet. Run: npm ci");
if (!existsSync(inRoot(".next", "phone-shell.json"))) fail("Nothing is built yet. Run: npm run build");
if ((await runNode(["--import", "tsx", "scripts/check-start.ts"])) !== 0) process.exit(1);
const address = await serve(Number(process.env.PORT || 3000));
console.log(`Greenarc is up: ${address}`);
