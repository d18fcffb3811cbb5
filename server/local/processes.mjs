import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { log, UserError } from './log.mjs';

/** Whether a process of this id exists (ours or another account's). */
export function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
}

function holderOf(file) {
  try {
    return Number(readFileSync(file, 'utf8'));
  } catch {
    return 0; // gone, or not written yet
  }
}

/** Runs one thing at a time among all start and test commands of this folder; a dead holder's lock is taken over. */
export async function withLock(file, work) {
  mkdirSync(dirname(file), { recursive: true });
  for (let tries = 0; ; tries++) {
    try {
      writeFileSync(file, String(process.pid), { flag: 'wx' });
      break;
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
      const holder = holderOf(file);
      if (holder && !isAlive(holder)) {
        rmSync(file, { force: true });
        continue;
      }
      if (tries === 0) log('waiting for another start of this folder');
      if (tries > 3000) throw new UserError(`gave up waiting for ${file}`);
      await sleep(100);
    }
  }
  try {
    return await work();
  } finally {
    rmSync(file, { force: true });
  }
}
