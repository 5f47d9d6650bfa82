import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

// Three kinds of test: plain ones in Node, components in a stand-in for the browser's page, and the
// built app in a real browser, which runs after the others, one file at a time. Last of all comes the
// table of checks, which reads what the others recorded.
export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          include: ['test/**/*.test.ts'],
          exclude: ['test/**/*.e2e.test.ts', 'test/**/*.last.test.ts'],
          environment: 'node',
          testTimeout: 30_000,
          benchmark: { include: [] },
        },
      },
      {
        plugins: [react()],
        test: {
          name: 'ui',
          include: ['test/**/*.test.tsx'],
          environment: 'happy-dom',
          benchmark: { include: [] },
        },
      },
      {
        test: {
          name: 'e2e',
          include: ['test/**/*.e2e.test.ts'],
          fileParallelism: false,
          sequence: { groupOrder: 1 },
          testTimeout: 60_000,
          hookTimeout: 60_000,
          benchmark: { include: [] },
        },
      },
      {
        test: {
          name: 'checks',
          include: ['test/**/*.last.test.ts'],
          environment: 'node',
          sequence: { groupOrder: 2 },
          benchmark: { include: [] },
        },
      },
    ],
  },
});
