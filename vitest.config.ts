// Unit, property, truth, command-line and protocol tests; the workbench tests have a runner of their own.
import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['test/{architecture,unit,property,truth,fixtures,lsp,cli}/**/*.test.ts'],
    setupFiles: ['test/support/propertySeed.ts'],
    testTimeout: 30_000,
    hookTimeout: 60_000,
    maxWorkers: 2,
  },
});
