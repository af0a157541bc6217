import type { NextConfig } from "next";

const config: NextConfig = {
  poweredByHeader: false,
  reactStrictMode: true,
  outputFileTracingRoot: import.meta.dirname,
  turbopack: { root: import.meta.dirname },
  // `npm test` checks the types of the whole tree, tests included; a build that did it again would only be slower.
  typescript: { ignoreBuildErrors: true },
  // The phone shell is one static page for every sortie; its script reads the id from the address.
  async rewrites() {
    return { beforeFiles: [{ source: "/debrief/:sortie", destination: "/debrief" }], afterFiles: [], fallback: [] };
  },
  // proxy.ts sees every other answer; these files it leaves alone.
  async headers() {
    return [{ source: "/_next/static/:path*", headers: [{ key: "X-Content-Type-Options", value: "nosniff" }] }];
  },
};

export default config;
