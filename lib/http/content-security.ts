/** The parts of the policy that no page loosens. */
const always = [
  "default-src 'self'",
  "img-src 'self' data: blob:",
  "font-src 'self'",
  "connect-src 'self'",
  "worker-src 'self'",
  "manifest-src 'self'",
  "frame-src 'none'",
  "object-src 'none'",
  "base-uri 'none'",
  "frame-ancestors 'none'",
  "form-action 'self'",
  // Server-rendered style attributes place marks on a gauge and blocks on the sheet; an attribute can hold no script and no selector.
  "style-src-attr 'unsafe-inline'",
];

/** For a page rendered per request: scripts run by a nonce of that request alone. React needs eval for its own messages in development. */
export function noncePolicy(nonce: string, development: boolean): string {
  const script = `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ""}`;
  // The development server puts style elements in without a nonce.
  const style = development ? "style-src 'self' 'unsafe-inline'" : `style-src 'self' 'nonce-${nonce}'`;
  return [...always, script, style].join("; ");
}

/** For a page that is the same file for everybody: its own inline scripts by hash, files from here, nothing else. */
export function hashPolicy(scriptHashes: readonly string[]): string {
  const script = ["script-src 'self'", ...scriptHashes.map((hash) => `'${hash}'`)].join(" ");
  return [...always, script, "style-src 'self'"].join("; ");
}

/** The same page under the development server, which renders it anew each time and cannot know its scripts beforehand. */
export function developmentShellPolicy(): string {
  return [...always, "script-src 'self' 'unsafe-inline' 'unsafe-eval'", "style-src 'self' 'unsafe-inline'"].join("; ");
}

/** The headers every answer carries. */
export function commonHeaders(overHttps: boolean): [name: string, value: string][] {
  const headers: [string, string][] = [
    ["X-Content-Type-Options", "nosniff"],
    ["X-Frame-Options", "DENY"],
    ["Referrer-Policy", "same-origin"],
    [
      "Permissions-Policy",
      "accelerometer=(), camera=(self), geolocation=(), gyroscope=(), magnetometer=(), microphone=(), payment=(), usb=()",
    ],
    ["Cross-Origin-Opener-Policy", "same-origin"],
    ["Cross-Origin-Resource-Policy", "same-origin"],
  ];
  if (overHttps) headers.push(["Strict-Transport-Security", "max-age=31536000; includeSubDomains"]);
  return headers;
}
