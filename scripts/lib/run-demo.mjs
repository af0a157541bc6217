import { dirname } from "node:path";
import { buildIfStale } from "./build-app.mjs";
import { prepareDemoData } from "./demo-data.mjs";
import { demoEmails, demoPassword, fillDemoSettings, wantedPort } from "./demo-settings.mjs";
import { install, requireWritable } from "./install.mjs";
import { fail, root } from "./project.mjs";
import { requireFreePort, serve } from "./serve.mjs";

const port = wantedPort() ?? fail(`PORT is ${process.env.PORT}; it must be a number from 1 to 65535.`);
process.chdir(root);
requireWritable(root);
await requireFreePort(port);
await install();
fillDemoSettings(port);
requireWritable(dirname(process.env.DATABASE_FILE));
await prepareDemoData(process.env.DATABASE_FILE, { fresh: process.argv.includes("--fresh") });
await buildIfStale().catch((error) => fail(error.message));
const address = await serve(port);

const password = process.env.DEMO_PASSWORD === demoPassword ? demoPassword : "the one in DEMO_PASSWORD";
console.log(`
Greenarc demo: ${address}

Sign in with the password ${password} as
  ${demoEmails.join("\n  ")}

All aircraft, limits and people of the demo are invented. Stop with Ctrl-C; start over with: npm run demo -- --fresh
`);
