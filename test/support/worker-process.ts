import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { PUBLIC_URL, type TestApp } from './api-app';

export interface WorkerProcess {
  readonly child: ChildProcess;
  /** Ends it without warning, as the kernel does when memory runs out. */
  kill(): Promise<void>;
}

/** The worker as the start command runs it: a process of its own. */
export async function startWorkerProcess(app: TestApp): Promise<WorkerProcess> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/worker.ts'], {
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
    env: {
      ...process.env,
      TSX_TSCONFIG_PATH: 'server/tsconfig.json',
      DATABASE_URL: app.databaseUrl,
      SMTP_URL: 'smtp://127.0.0.1:1',
      PUBLIC_URL,
      SESSION_SECRET: 'only for the tests, and long enough',
      LOG_LEVEL: 'silent',
    },
  });
  await once(child, 'message');
  return {
    child,
    kill: async () => {
      if (child.exitCode !== null || child.signalCode !== null) return;
      const gone = once(child, 'exit');
      child.kill('SIGKILL');
      await gone;
    },
  };
}
