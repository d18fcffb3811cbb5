import { spawnSync } from 'node:child_process';
import { readFileSync, statSync } from 'node:fs';
import { UserError } from './log.mjs';

function lookUp(name) {
  const line =
    readFileSync('/etc/passwd', 'utf8')
      .split('\n')
      .find((entry) => entry.startsWith(`${name}:`)) ??
    spawnSync('getent', ['passwd', name], { encoding: 'utf8' }).stdout?.trim();
  if (!line) return null;
  const fields = line.split(':');
  return { name, uid: Number(fields[2]), gid: Number(fields[3]) };
}

/**
 * The account that runs the database server: null for ourselves. PostgreSQL refuses root, so root lends it to the
 * owner of the data folder, to `postgres` or to `nobody`.
 */
export function serverAccount(dataFolder) {
  if (process.getuid?.() !== 0) return null;
  try {
    const { uid, gid } = statSync(dataFolder);
    if (uid !== 0) return { name: `account ${uid}`, uid, gid };
  } catch (error) {
    if (error.code !== 'ENOENT') throw error;
  }
  const account = lookUp('postgres') ?? lookUp('nobody');
  if (!account)
    throw new UserError(
      'PostgreSQL does not run as root, and there is no account postgres or nobody to run it.',
    );
  return account;
}

/** Whether the account may pass through a folder (a checkout under /root is closed to all others). */
export const canEnter = (folder, account) =>
  !account ||
  spawnSync('test', ['-x', folder], { uid: account.uid, gid: account.gid, cwd: '/' }).status === 0;

/** Runs a program of PostgreSQL's as the account; throws with its own words when it fails. */
export function runAs(account, program, args, { input = '', password } = {}) {
  const result = spawnSync(program, args, {
    cwd: '/', // the account may not be allowed to enter ours
    encoding: 'utf8',
    input,
    env: {
      PATH: process.env.PATH ?? '/usr/bin:/bin',
      LC_ALL: 'C.UTF-8',
      TZ: 'UTC',
      HOME: '/',
      ...(password ? { PGPASSWORD: password } : { PGPASSFILE: '/dev/null' }),
    },
    ...(account && { uid: account.uid, gid: account.gid }),
  });
  if (result.error) throw result.error;
  if (result.status !== 0)
    throw new Error(
      `${program} failed (${result.status}): ${(result.stderr || result.stdout).trim()}`,
    );
  return result.stdout.trim();
}
