// Starts the command in any clone: installs what is missing, bundles the sources when they changed, and runs them.
// Node's own modules only: node_modules may be missing.
import { existsSync, mkdirSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { argv, exit, pid, stderr, stdin, stdout } from 'node:process';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { ensureDependencies } from '../local/dependencies.mjs';
import { explain } from '../local/log.mjs';
import { treeHash } from '../local/tree-hash.mjs';

const root = resolve(dirname(fileURLToPath(import.meta.url)), '../..');

/** Path of the bundle of these very sources; its name holds their hash, so that two commands at once do not disturb each other. */
async function bundle() {
  const hash = treeHash(root, 'libs', 'server', 'package-lock.json', 'tsconfig.json');
  const folder = join(root, 'dist/cli');
  const file = join(folder, `analyse-${hash.slice(0, 16)}.mjs`);
  if (existsSync(file)) return file;
  const { build } = await import('esbuild');
  const { outputFiles } = await build({
    entryPoints: [join(root, 'server/cli/analyse.ts')],
    bundle: true,
    write: false,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    logLevel: 'warning',
    tsconfig: join(root, 'server/tsconfig.json'),
  });
  mkdirSync(folder, { recursive: true });
  const bundles = readdirSync(folder).filter((name) => name.endsWith('.mjs'));
  for (const old of bundles) rmSync(join(folder, old), { force: true });
  const unfinished = `${file}.${pid}`;
  writeFileSync(unfinished, outputFiles[0].contents);
  renameSync(unfinished, file);
  return file;
}

try {
  await ensureDependencies(root);
  const { runAnalyse } = await import(pathToFileURL(await bundle()).href);
  // A reader that has seen enough (`| head`) closes the pipe: nothing is wrong then.
  stdout.on('error', () => exit(0));
  const { exitCode, output, complaint } = await runAnalyse(argv.slice(2), stdin);
  if (complaint !== null) stderr.write(`${complaint}\n`);
  stdout.write(output, () => exit(exitCode));
} catch (error) {
  stderr.write(`${explain(error)}\n`);
  exit(1);
}
