import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  resolve: {
    alias: [
      { find: /^server-only$/, replacement: here("./tests/support/server-only.ts") },
      { find: /^@\//, replacement: here("./") },
    ],
  },
  test: {
    include: ["tests/**/*.test.ts", "tests/**/*.test.tsx"],
    exclude: ["tests/e2e/**", "node_modules/**"],
    environment: "node",
    setupFiles: ["tests/support/property-seed.ts"],
    restoreMocks: true,
    testTimeout: 20_000,
    hookTimeout: 60_000,
    coverage: { include: ["lib/**", "db/**", "components/**", "app/**"] },
  },
});
