import { requireNode } from "./lib/require-node.mjs";

requireNode();
import("./lib/run-bench.mjs");
