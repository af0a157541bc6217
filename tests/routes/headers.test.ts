import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { NextRequest } from "next/server";
import { afterAll, beforeAll, beforeEach, describe, expect, test, vi } from "vitest";
import proxy from "@/proxy";

// SHA-256 of the empty string in base64, a value any tool gives: openssl dgst -sha256 -binary </dev/null | base64
const emptyHash = "sha256-47DEQpj8HBSa+/TImW+5JCeuQeRkm5NMpJWZG3hSuFU=";
let folder: string;

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "greenarc-headers-"));
  mkdirSync(join(folder, ".next"));
  writeFileSync(join(folder, ".next", "phone-shell.json"), JSON.stringify({ scriptHashes: [emptyHash] }));
});
beforeEach(() => {
  vi.spyOn(process, "cwd").mockReturnValue(folder);
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const answer = (path: string, headers: Record<string, string> = {}) =>
  proxy(new NextRequest(`http://greenarc.example${path}`, { headers }));

function directives(path: string): Map<string, string> {
  const policy = answer(path).headers.get("Content-Security-Policy") ?? "";
  return new Map(policy.split("; ").map((part) => [part.split(" ")[0] ?? "", part.split(" ").slice(1).join(" ")]));
}

describe("the Content-Security-Policy", () => {
  test.each(["/", "/sign-in", "/debrief", "/debrief/abc", "/api/v1/sorties", "/debriefs"])(
    "closes the doors on %s that no page needs",
    (path) => {
      const policy = directives(path);
      expect(policy.get("default-src")).toBe("'self'");
      for (const name of ["object-src", "base-uri", "frame-ancestors"]) expect(policy.get(name)).toBe("'none'");
      expect(policy.get("form-action")).toBe("'self'");
      expect(policy.get("script-src")).not.toMatch(/unsafe|https?:|\*/);
      expect(policy.get("style-src")).not.toContain("unsafe");
    },
  );

  test("gives every request to a page a nonce of its own, 16 bytes long, and tells Next the same one", () => {
    const nonces = [answer("/"), answer("/")].map((response) => {
      const nonce = /'nonce-([^']+)'/.exec(response.headers.get("Content-Security-Policy") ?? "")?.[1] ?? "";
      expect(response.headers.get("x-middleware-request-x-nonce")).toBe(nonce);
      expect(response.headers.get("x-middleware-request-content-security-policy")).toContain(`'nonce-${nonce}' 'strict-dynamic'`);
      return nonce;
    });
    expect(nonces.map((nonce) => Buffer.from(nonce, "base64").length)).toEqual([16, 16]);
    expect(nonces[0]).not.toBe(nonces[1]);
  });

  test("does not let the caller choose the nonce", () => {
    const response = answer("/", { "x-nonce": "chosen", "content-security-policy": "script-src 'nonce-chosen'" });
    expect(response.headers.get("Content-Security-Policy")).not.toContain("chosen");
    expect(response.headers.get("x-middleware-request-content-security-policy")).not.toContain("chosen");
  });

  test.each(["/debrief", "/debrief/abc"])("allows %s its own scripts by hash, the same for every request", (path) => {
    expect(directives(path).get("script-src")).toBe(`'self' '${emptyHash}'`);
    expect(directives(path).get("style-src")).toBe("'self'");
  });
});

describe("the other headers", () => {
  test("stand on every answer", () => {
    const { headers } = answer("/api/v1/sorties");
    expect(headers.get("X-Content-Type-Options")).toBe("nosniff");
    expect(headers.get("X-Frame-Options")).toBe("DENY");
    expect(headers.get("Referrer-Policy")).toBe("same-origin");
    expect(headers.get("Cross-Origin-Opener-Policy")).toBe("same-origin");
    expect(headers.get("Cross-Origin-Resource-Policy")).toBe("same-origin");
    expect(headers.get("Permissions-Policy")).toContain("geolocation=()");
  });

  // RFC 6797, section 7.2: not over plain HTTP.
  test("hold the browser to https only where the page came over https", () => {
    expect(answer("/").headers.has("Strict-Transport-Security")).toBe(false);
    expect(answer("/", { "x-forwarded-proto": "https" }).headers.get("Strict-Transport-Security")).toMatch(/^max-age=31536000/);
  });
});
