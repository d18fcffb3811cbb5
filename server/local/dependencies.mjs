// Node's own modules only: node_modules may be missing.
import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { log, UserError } from './log.mjs';

function packagesOf(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages ?? null;
  } catch {
    return null; // missing, or cut short by an interrupted install: both mean "install"
  }
}

/**
 * Whether node_modules is what package-lock.json asks for. npm writes its own copy of the lock file last, so an
 * interrupted install is never taken for a whole one and an install by hand counts.
 */
export function dependenciesAreFresh(root) {
  const wanted = packagesOf(join(root, 'package-lock.json'));
  if (!wanted) throw new UserError('package-lock.json is missing or cannot be read');
  const installed = packagesOf(join(root, 'node_modules', '.package-lock.json'));
  if (!installed) return false;
  for (const [path, want] of Object.entries(wanted)) {
    if (!path.startsWith('node_modules/')) continue;
    const have = installed[path];
    if (!have && !want.optional) return false; // optional: other platforms' binaries
    if (have && (have.version !== want.version || have.integrity !== want.integrity)) return false;
  }
  return Object.keys(installed).every((path) => path in wanted);
}

/** Runs `npm ci` when node_modules is missing or out of step. Its output goes to standard error. */
export async function ensureDependencies(root) {
  if (dependenciesAreFresh(root)) return;
  log('installing the npm packages');
  // npm_execpath is set when npm started us; --include=dev because NODE_ENV=production would drop the build tools
  const npmScript = process.env.npm_execpath;
  const viaNode = npmScript && /npm-cli\.[cm]?js$/.test(npmScript);
  const [command, before] = viaNode ? [process.execPath, [npmScript]] : ['npm', []];
  const code = await new Promise((resolve, reject) => {
    const child = spawn(command, [...before, 'ci', '--include=dev', '--no-audit', '--no-fund'], {
      cwd: root,
      stdio: ['ignore', 2, 2],
    });
    child.on('error', reject);
    child.on('exit', (status, signal) => resolve(status ?? signal));
  });
  if (code !== 0) throw new UserError(`npm ci failed (${code})`);
}
