// Runs the benchmarks on bundles, as the worker runs in production: the loader for development slows closures down.
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { argv, execPath } from 'node:process';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = fileURLToPath(new URL('../..', import.meta.url));
const outdir = join(root, 'dist/bench');
const all = ['read-log', 'analyse-night', 'busy-web'];
const asked = all.filter((name) => argv.length === 2 || argv.includes(name));

await build({
  entryPoints: asked.map((name) => join(root, 'test/bench', `${name}.ts`)),
  outdir,
  bundle: true,
  platform: 'node',
  target: 'node20',
  format: 'esm',
  packages: 'external',
  outExtension: { '.js': '.mjs' },
  logLevel: 'warning',
  tsconfig: join(root, 'server/tsconfig.json'),
});
// Each in a process of its own: peak memory is a process's, and the garbage of one is not the other's work.
for (const name of asked) {
  const { status } = spawnSync(execPath, [join(outdir, `${name}.mjs`)], { stdio: 'inherit' });
  if (status !== 0) process.exitCode = 1;
}
