import { createServer } from "node:http";
import { fail, root } from "./project.mjs";

const host = "127.0.0.1";

/** Ends with one line when somebody else listens on the port: asked before the long work starts. */
export async function requireFreePort(port) {
  const probe = createServer();
  await new Promise((done) => {
    probe.once("error", (error) => fail(portProblem(error, port)));
    probe.listen(port, host, () => probe.close(done));
  });
}

/** Serves the built program in this very process, so that a signal to it is a signal to the server. */
export async function serve(port) {
  process.env.NODE_ENV = "production";
  process.env.NEXT_TELEMETRY_DISABLED = "1";
  const { default: next } = await import("next");
  const app = next({ dev: false, dir: root, hostname: host, port });
  await app.prepare();
  const handle = app.getRequestHandler();
  const server = createServer((request, response) => {
    handle(request, response).catch((error) => {
      console.error(error);
      response.destroy();
    });
  });
  stopOnSignal(server, app);
  await new Promise((done) => {
    server.once("error", (error) => fail(portProblem(error, port)));
    server.listen(port, host, done);
  });
  return `http://${host}:${port}`;
}

/** Requests under way are finished, for ten seconds at most; a second signal ends at once. */
function stopOnSignal(server, app) {
  let stopping = false;
  const stop = () => {
    if (stopping) process.exit(1);
    stopping = true;
    setTimeout(() => process.exit(1), 10_000).unref();
    server.close(() => app.close().finally(() => process.exit(0)));
    server.closeIdleConnections();
  };
  process.on("SIGINT", stop);
  process.on("SIGTERM", stop);
}

function portProblem(error, port) {
  if (error.code === "EADDRINUSE")
    return `Port ${port} on ${host} is in use. Stop what listens there, or choose another: PORT=${port + 1} npm run …`;
  if (error.code === "EACCES") return `Port ${port} needs more rights than this user has. Choose one above 1023 with PORT.`;
  return `Cannot listen on ${host}:${port}: ${error.message}`;
}
