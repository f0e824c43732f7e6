import { fileURLToPath } from 'node:url';

import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));
const alias = [{ find: /^@\//, replacement: root }];
const node = { environment: 'node' as const };

export default defineConfig({
  test: {
    projects: [
      {
        resolve: { alias },
        test: {
          ...node,
          name: 'unit',
          // how fast the engine is, its benchmark says; here a slow machine is no failure
          testTimeout: 60_000,
          include: ['tests/{flows,outside,checks,db/unit}/**/*.test.ts', 'tests/shared/{contract,quantity,workings,record}/**/*.test.ts', 'tests/server/unit/**/*.test.ts'],
        },
      },
      {
        resolve: { alias },
        test: {
          ...node,
          name: 'api',
          include: ['tests/server/api/**/*.test.ts', 'tests/db/api/**/*.test.ts'],
          globalSetup: ['tests/setup/cluster.ts'],
          testTimeout: 20_000,
          hookTimeout: 60_000,
          maxWorkers: 2,
        },
      },
      {
        resolve: {
          alias: [
            ...alias,
            { find: /^react-native$/, replacement: 'react-native-web' },
            { find: /^expo-router$/, replacement: `${root}tests/shared/ui/routerDouble.tsx` },
            { find: '@react-native-vector-icons/material-design-icons', replacement: `${root}shared/ui/theme/PaperIcon.tsx` },
          ],
          mainFields: ['browser', 'module', 'jsnext:main', 'main'],
          extensions: ['.web.tsx', '.web.ts', '.web.js', '.tsx', '.ts', '.mjs', '.js', '.json'],
        },
        define: { __DEV__: 'false' },
        test: {
          name: 'ui',
          include: ['tests/shared/ui/**/*.test.{ts,tsx}'],
          environment: 'jsdom',
          server: { deps: { inline: [/react-native/, /@callstack/] } },
        },
      },
    ],
  },
});
