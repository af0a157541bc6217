import { requireNode } from "./lib/require-node.mjs";

requireNode();
import("./lib/build-app.mjs").then((module) => module.buildApp());
