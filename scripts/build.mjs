import { requireNode } from "./lib/require-node.mjs";

requireNode();
import("./lib/build-app.mjs").then(async ({ buildApp }) => {
  await buildApp().catch((error) => {
    console.error(error.message);
    process.exit(1);
  });
});
