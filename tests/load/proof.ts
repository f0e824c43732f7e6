/** `npm run bench:proof`: the rounds of proof against machine, oracle and walker, with 10,000 random trees each (or as many as are given). */
import { spawnSync } from 'node:child_process';

const cases = process.argv[2] ?? '10000';
const rounds = ['tests/flows/proof/oracle.test.ts', 'tests/flows/proof/machine.test.ts', 'tests/flows/machine/walker.test.ts'];
const { status } = spawnSync(process.execPath, ['node_modules/vitest/vitest.mjs', 'run', '--project', 'unit', ...rounds], { stdio: 'inherit', env: { ...process.env, PROOF_CASES: cases } });
process.exitCode = status ?? 1;
