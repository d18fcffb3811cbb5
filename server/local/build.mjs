// Builds what runs: the server's bundles and the client. Each is left alone when nothing that goes into it changed.
import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { argv } from 'node:process';
import { fileURLToPath } from 'node:url';
import { explain, log, UserError } from './log.mjs';
import { withLock } from './processes.mjs';
import { treeHash } from './tree-hash.mjs';

const SHARED = ['libs', 'package-lock.json', 'tsconfig.json'];

/** Runs `make` unless the stamp of the last finished run shows the same sources. */
async function whenChanged(root, { output, sources }, make) {
  const stamp = join(root, output, '.sources');
  const hash = treeHash(root, ...sources, ...SHARED);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return;
  rmSync(stamp, { force: true });
  await make();
  mkdirSync(dirname(stamp), { recursive: true });
  writeFileSync(stamp, hash);
}

async function bundleServer(root) {
  const { build } = await import('esbuild');
  const entry = (path) => join(root, 'server', path);
  await build({
    entryPoints: {
      main: entry('main.ts'),
      worker: entry('worker.ts'),
      migrate: entry('migrate.ts'),
      'mail-catcher': entry('local/mail-catcher.ts'),
    },
    outdir: join(root, 'dist/server'),
    bundle: true,
    splitting: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external', // CommonJS packages read files beside themselves
    sourcemap: true,
    sourcesContent: false,
    logLevel: 'warning',
    tsconfig: join(root, 'server/tsconfig.json'),
  });
}

async function buildClient(root) {
  log('building the client');
  const ng = join(root, 'node_modules/@angular/cli/bin/ng.js');
  const code = await new Promise((done, fail) => {
    const child = spawn(process.execPath, [ng, 'build', '--progress=false'], {
      cwd: root,
      stdio: ['ignore', 2, 2],
      env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
    });
    child.on('error', fail);
    child.on('exit', (status, signal) => done(status ?? signal));
  });
  if (code !== 0) throw new UserError(`the client could not be built (${code})`);
}

/** Brings dist/server and dist/web up to date. */
export async function buildAll(root) {
  await withLock(join(root, '.local/build.lock'), async () => {
    await whenChanged(root, { output: 'dist/server', sources: ['server', 'migrations'] }, () =>
      bundleServer(root),
    );
    await whenChanged(root, { output: 'dist/web', sources: ['apps/web', 'angular.json'] }, () =>
      buildClient(root),
    );
  });
}

if (resolve(argv[1]) === fileURLToPath(import.meta.url)) {
  try {
    await buildAll(resolve(dirname(argv[1]), '../..'));
  } catch (error) {
    log(explain(error));
    process.exit(1);
  }
}
