import { type ChildProcess, fork } from "node:child_process";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import type { KneeboardModel } from "@/lib/pdf/kneeboard/model";
import { projectFolder } from "@/lib/pdf/project-folder";
import type { RenderAnswer } from "./messages";

/** One sheet takes tens to hundreds of milliseconds; beyond this something is wrong. The first also starts the process. */
const TIMEOUT_MS = 30_000;
/** The PDF library keeps some memory of each document: a fresh process now and then gives it back. */
const SHEETS_PER_PROCESS = 500;

export class RenderFailed extends Error {}

type Job = { id: number; model: KneeboardModel; resolve: (pdf: Uint8Array) => void; reject: (error: Error) => void };

/** Draws one sheet after the other in a process of its own, so that no request waits for the drawing of another's. */
class RenderQueue {
  private waiting: Job[] = [];
  private current: Job | null = null;
  private child: ChildProcess | null = null;
  private timer: NodeJS.Timeout | null = null;
  private drawn = 0;
  private lastId = 0;

  add(model: KneeboardModel): Promise<Uint8Array> {
    return new Promise((resolve, reject) => {
      this.lastId += 1;
      this.waiting.push({ id: this.lastId, model, resolve, reject });
      this.next();
    });
  }

  close(): void {
    this.dropChild();
    this.fail("The sheet was not drawn: the server is stopping.");
  }

  private next(): void {
    if (this.current !== null) return;
    const job = this.waiting.shift();
    if (!job) return;
    this.current = job;
    this.timer = setTimeout(() => {
      this.dropChild();
      this.fail(`The sheet was not drawn within ${TIMEOUT_MS / 1000} s. Try again; if it happens again, tell the administrator.`);
    }, TIMEOUT_MS);
    try {
      const child = this.startedChild();
      child.ref();
      child.channel?.ref();
      child.send({ id: job.id, model: job.model });
    } catch (error) {
      this.dropChild();
      this.fail(error instanceof Error ? error.message : String(error));
    }
  }

  private startedChild(): ChildProcess {
    if (this.child?.connected) return this.child;
    const folder = projectFolder();
    const tsx = pathToFileURL(join(folder, "node_modules", "tsx", "dist", "esm", "index.mjs")).href;
    const child = fork(/* turbopackIgnore: true */ join(folder, "lib", "pdf", "render-worker", "child.ts"), [], {
      cwd: folder,
      execArgv: ["--import", tsx],
      serialization: "advanced",
      stdio: ["ignore", "ignore", "inherit", "ipc"],
      env: { PATH: process.env.PATH, NODE_ENV: "production", TSX_TSCONFIG_PATH: join(folder, "tsconfig.json") },
    });
    child.on("message", (answer: RenderAnswer) => this.settle(child, answer));
    child.on("error", (error) => this.lost(child, error.message));
    child.on("exit", (code) => this.lost(child, `the drawing process ended with ${code}`));
    this.child = child;
    this.drawn = 0;
    return child;
  }

  private settle(child: ChildProcess, answer: RenderAnswer): void {
    const job = this.current;
    if (child !== this.child || job === null || job.id !== answer.id) return;
    if ("error" in answer) {
      this.fail(`The sheet was not drawn: ${answer.error}`);
      return;
    }
    this.drawn += 1;
    this.release();
    job.resolve(new Uint8Array(answer.pdf));
    if (this.drawn >= SHEETS_PER_PROCESS) this.dropChild();
    this.next();
  }

  private lost(child: ChildProcess, why: string): void {
    if (child !== this.child) return;
    this.child = null;
    this.fail(`The sheet was not drawn: ${why}. Try again.`);
  }

  private fail(message: string): void {
    const job = this.current;
    this.release();
    job?.reject(new RenderFailed(message));
    this.next();
  }

  /** An idle child must not keep a script or a stopping server alive. */
  private release(): void {
    if (this.timer) clearTimeout(this.timer);
    this.timer = null;
    this.current = null;
    this.child?.unref();
    this.child?.channel?.unref();
  }

  private dropChild(): void {
    const child = this.child;
    this.child = null;
    child?.kill();
  }
}

// Kept on the global object: the server's bundler may load this module once a route.
const shared = globalThis as typeof globalThis & { greenarcRenderQueue?: RenderQueue };

function queue(): RenderQueue {
  shared.greenarcRenderQueue ??= new RenderQueue();
  return shared.greenarcRenderQueue;
}

/** The sheet as a PDF, drawn in another process. Rejects with RenderFailed, whose message may be shown. */
export function renderKneeboardOffThread(model: KneeboardModel): Promise<Uint8Array> {
  return queue().add(model);
}

/** Ends the drawing process, for tests and a stopping server. */
export function stopRendering(): void {
  shared.greenarcRenderQueue?.close();
  delete shared.greenarcRenderQueue;
}
