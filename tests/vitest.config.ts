import { defineConfig } from 'vitest/config';
import { ClosingLineReporter } from './support/closing-line-reporter.ts';

export default defineConfig({
  test: {
    reporters: ['default', new ClosingLineReporter()],
    allowOnly: false,
    passWithNoTests: false,
    projects: [
      { extends: true, test: { name: 'core', include: ['{core,reference,house,mobile}/**/*.test.ts'] } },
      {
        extends: true,
        test: { name: 'database', include: ['{db,api,security}/**/*.test.ts'], testTimeout: 30_000, hookTimeout: 60_000 },
      },
      {
        extends: true,
        test: { name: 'browser', include: ['e2e/**/*.test.ts'], testTimeout: 240_000, hookTimeout: 240_000, fileParallelism: false },
      },
    ],
  },
});
