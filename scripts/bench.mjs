// Runs the benchmark of the solver in TypeScript; arguments are passed on. See tests/bench/solver-bench.ts.
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const script = fileURLToPath(new URL('../tests/bench/solver-bench.ts', import.meta.url));
const { status } = spawnSync(process.execPath, ['--import', 'tsx', script, ...process.argv.slice(2)], {
  stdio: 'inherit',
});
process.exit(status ?? 1);
