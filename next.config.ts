import type { NextConfig } from "next";

const config: NextConfig = {
  poweredByHeader: false,
  reactStrictMode: true,
  outputFileTracingRoot: import.meta.dirname,
  turbopack: { root: import.meta.dirname },
  // The phone shell is one static page for every sortie; its script reads the id from the address.
  async rewrites() {
    return { beforeFiles: [{ source: "/debrief/:sortie", destination: "/debrief" }], afterFiles: [], fallback: [] };
  },
};

export default config;
