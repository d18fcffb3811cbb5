import { spawnSync } from 'node:child_process';
import { readFileSync, readlinkSync, realpathSync } from 'node:fs';
import { join } from 'node:path';
import { isAlive } from './processes.mjs';

/** What postmaster.pid of a data folder says, or null when there is none. */
export function readPidFile(dataFolder) {
  try {
    const lines = readFileSync(join(dataFolder, 'postmaster.pid'), 'utf8').split('\n');
    return { pid: Number(lines[0]), port: Number(lines[3]), status: (lines[7] ?? '').trim() };
  } catch (error) {
    if (error.code === 'ENOENT') return null;
    throw error;
  }
}

function isZombie(pid) {
  try {
    return /^\d+ \(.*\) [ZX]/s.test(readFileSync(`/proc/${pid}/stat`, 'utf8'));
  } catch {
    return false; // no /proc on this system
  }
}

/**
 * Whose is the process that a pid file names? A pid alone proves nothing, it may have been given to another process
 * since; neither does the command line. A postmaster's working directory is its data folder.
 *
 * @returns 'ours', 'dead', 'zombie', 'other' (certainly not our server) or 'unsure' (touch nothing)
 */
export function whose(pid, dataFolder) {
  if (!pid || !isAlive(pid)) return 'dead';
  if (isZombie(pid)) return 'zombie'; // PostgreSQL would take it for a living server and refuse to start
  try {
    return readlinkSync(`/proc/${pid}/cwd`) === realpathSync(dataFolder) ? 'ours' : 'other';
  } catch {
    // no /proc, or another account's process: ask ps below
  }
  const { status, stdout } = spawnSync('ps', ['-ww', '-o', 'args=', '-p', String(pid)], {
    encoding: 'utf8',
  });
  if (status !== 0) return 'unsure';
  if (stdout.includes(dataFolder)) return 'ours';
  return /postgres|postmaster/.test(stdout) ? 'unsure' : 'other';
}
