import { requireNode } from "./lib/require-node.mjs";

requireNode();
import("./lib/install.mjs").then((module) => module.install());
