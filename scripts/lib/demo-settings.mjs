import { randomBytes } from "node:crypto";
import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { resolve } from "node:path";
import { inRoot, root } from "./project.mjs";

export const demoPassword = "cowl-open-68";
export const demoEmails = ["engineer", "reviewer", "pilot", "mechanic", "admin", "observer"].map((role) => `${role}@harrowfen.example`);

/** Settings of a demo or a working copy: what is set stays, the rest is filled in; the secret is made once and kept beside the data. */
export function fillDemoSettings(port) {
  const secretFile = inRoot("data", "demo-secret");
  if (!process.env.NEXTAUTH_SECRET) {
    if (!existsSync(secretFile)) {
      mkdirSync(inRoot("data"), { recursive: true });
      writeFileSync(secretFile, randomBytes(48).toString("base64url"), { mode: 0o600 });
    }
    process.env.NEXTAUTH_SECRET = readFileSync(secretFile, "utf8");
  }
  process.env.PORT = String(port);
  process.env.NEXTAUTH_URL ||= `http://127.0.0.1:${port}`;
  process.env.DEMO_PASSWORD ||= demoPassword;
  process.env.GREENARC_DEMO = "1";
  process.env.DATABASE_FILE = resolve(root, process.env.DATABASE_FILE || "data/greenarc.db");
}

/** The port asked for, or undefined when it is no port. */
export function wantedPort() {
  const text = process.env.PORT || "3000";
  const port = Number(text);
  return Number.isInteger(port) && port > 0 && port < 65536 ? port : undefined;
}
