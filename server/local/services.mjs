import { spawn } from 'node:child_process';
import path from 'node:path';
import { log, UserError } from './log.mjs';

const RESTARTS_PER_MINUTE = 5;
const GRACE_MS = 10_000;

/**
 * The processes of an installation. Each runs in a process group of its own, so that Ctrl-C reaches only the start
 * command, which ends them in order; over the IPC channel a child says that it is ready, and notices when the start
 * command was killed.
 */
export class Services {
  children = new Set();
  stopping = false;
  onFailure = () => undefined;

  constructor(root) {
    this.root = root;
  }

  spawn(file, env) {
    const child = spawn(process.execPath, ['--enable-source-maps', path.join(this.root, file)], {
      cwd: this.root,
      detached: true,
      stdio: ['ignore', 2, 2, 'ipc'],
      env,
    });
    this.children.add(child);
    child.once('exit', () => this.children.delete(child));
    return child;
  }

  /** Keeps a process running; resolves with its first message once it is ready. */
  start(name, file, env) {
    const ends = [];
    return new Promise((resolve) => {
      const launch = () => {
        const child = this.spawn(file, env);
        child.once('message', resolve);
        child.once('exit', (code, signal) => {
          if (this.stopping) return;
          log(`${name} ended unexpectedly (${code ?? signal})`);
          ends.push(Date.now());
          const recent = ends.filter((at) => at > Date.now() - 60_000);
          if (recent.length > RESTARTS_PER_MINUTE) this.onFailure(`${name} keeps ending`);
          else setTimeout(() => this.stopping || launch(), 500);
        });
      };
      launch();
    });
  }

  kill() {
    for (const child of this.children) child.kill('SIGKILL');
  }

  /** Ends all of them, by force after ten seconds. */
  async stop() {
    this.stopping = true;
    const gone = [...this.children].map((child) => new Promise((done) => child.once('exit', done)));
    for (const child of this.children) child.kill('SIGTERM');
    const force = setTimeout(() => this.kill(), GRACE_MS);
    await Promise.all(gone);
    clearTimeout(force);
  }
}

/** Runs a process to its end. */
export async function runOnce(services, file, env) {
  const child = services.spawn(file, env);
  const code = await new Promise((resolve) =>
    child.once('exit', (status, signal) => resolve(status ?? signal)),
  );
  if (code !== 0 && !services.stopping) throw new UserError(`${file} failed (${code})`);
}
