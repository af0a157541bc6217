import { spawn } from "node:child_process";
import { root } from "./project.mjs";

/**
 * Runs a command to its end and answers its exit code. A signal to this process is passed on, and this process ends only
 * after the command has: nothing is left behind.
 */
export function runCommand(command, args, { env = process.env, stdio = "inherit", onOutput } = {}) {
  return new Promise((done) => {
    const child = spawn(command, args, { cwd: root, env, stdio: onOutput ? ["ignore", "pipe", "pipe"] : stdio });
    let stopping = null;
    const pass = (signal) => {
      stopping = signal;
      child.kill(signal);
    };
    process.on("SIGINT", pass);
    process.on("SIGTERM", pass);
    if (onOutput) {
      child.stdout.on("data", onOutput);
      child.stderr.on("data", onOutput);
    }
    const end = (code) => {
      process.off("SIGINT", pass);
      process.off("SIGTERM", pass);
      if (stopping) process.exit(stopping === "SIGINT" ? 130 : 143);
      done(code);
    };
    child.on("error", () => end(127));
    child.on("close", (code) => end(code ?? 1));
  });
}

/** The same with this Node. */
export const runNode = (args, options) => runCommand(process.execPath, args, options);
