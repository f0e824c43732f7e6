import expo from 'eslint-config-expo/flat.js';
import { defineConfig, globalIgnores } from 'eslint/config';

const pureRooms = ['flows', 'shared/contract', 'shared/quantity', 'shared/workings', 'shared/record'].map((room) => `${room}/**/*.ts`);
const insteadOf = (what, instead) => ({ name: what, message: `This room is pure: ${instead}` });
const time = 'time comes in with an event or an argument.';
const outside = 'give the value in as an argument; reading and writing is the caller’s business.';

const paperDoor = {
  group: ['react-native-paper', 'react-native-paper/*'],
  message: 'shared/ui/components is the only door to this kit: use or extend one of our own components.',
};

export default defineConfig([
  globalIgnores(['dist*/**', 'build/**', '.expo/**', '.lampstep/**', 'node_modules/**', 'expo-env.d.ts', 'public/**', 'coverage/**', 'test-results/**', 'playwright-report/**']),
  expo,
  {
    files: ['**/*.{ts,tsx}'],
    languageOptions: {
      parserOptions: {
        // The first program that holds a file is the one that checks it: the pure rooms without node or DOM types.
        project: ['./tsconfig.pure.json', './tsconfig.server.json', './tsconfig.json'],
        tsconfigRootDir: import.meta.dirname,
      },
    },
    rules: {
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/only-throw-error': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
      // A schema and the type made from it share one name.
      '@typescript-eslint/no-redeclare': 'off',
      'no-restricted-imports': ['error', { patterns: [paperDoor] }],
      // The type checker finds these, with the aliases that the import plugin does not know, and without parsing every module again.
      'import/no-unresolved': 'off',
      'import/named': 'off',
      'import/namespace': 'off',
      'import/default': 'off',
      'import/export': 'off',
      'import/no-named-as-default': 'off',
      'import/no-named-as-default-member': 'off',
      'import/no-cycle': 'off',
      eqeqeq: 'error',
    },
  },
  {
    files: ['shared/ui/components/**/*.{ts,tsx}', 'shared/ui/theme/**/*.{ts,tsx}'],
    rules: { 'no-restricted-imports': 'off' },
  },
  {
    files: pureRooms,
    rules: {
      'no-restricted-globals': [
        'error',
        ...['Date', 'performance', 'setTimeout', 'setInterval', 'setImmediate', 'clearTimeout', 'clearInterval', 'clearImmediate', 'queueMicrotask', 'requestAnimationFrame', 'requestIdleCallback'].map((name) =>
          insteadOf(name, time),
        ),
        ...['fetch', 'XMLHttpRequest', 'WebSocket', 'console', 'process', 'crypto', 'window', 'document', 'navigator', 'localStorage', 'sessionStorage', 'indexedDB', 'globalThis', 'self', 'Buffer', 'require', 'alert'].map((name) =>
          insteadOf(name, outside),
        ),
      ],
      'no-restricted-properties': ['error', { object: 'Math', property: 'random', message: 'This room is pure: give the number in as an argument.' }],
    },
  },
  {
    // Handlers reach the element through our webProps, which this rule of the React compiler (not in use) takes for a read of
    // their refs while drawing.
    files: ['shared/ui/**/*.tsx'],
    rules: { 'react-hooks/refs': 'off' },
  },
  { files: ['**/*.cjs'], languageOptions: { globals: { __dirname: 'readonly', require: 'readonly', module: 'writable' } } },
  // Variables of the environment are read at run time there, not put in by the bundler.
  { files: ['server/**', 'tests/**', '*.config.ts'], rules: { 'expo/no-dynamic-env-var': 'off' } },
  // Not React: a fixture's `use` is Playwright's.
  { files: ['tests/e2e/**'], rules: { 'react-hooks/rules-of-hooks': 'off' } },
]);
