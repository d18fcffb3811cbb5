import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { PUBLIC_URL } from './api-app';

export interface ServerProcess {
  readonly child: ChildProcess;
  /** Of the web process: where it listens. */
  readonly baseUrl: string;
  /** Ends it without warning, as the kernel does when memory runs out. */
  kill(): Promise<void>;
}

/** Web process or worker as the start command runs it: a process of its own. */
export async function startServerProcess(
  entry: 'main' | 'worker',
  databaseUrl: string,
): Promise<ServerProcess> {
  const child = spawn(process.execPath, ['--import', 'tsx', `server/${entry}.ts`], {
    stdio: ['ignore', 'ignore', 'ignore', 'ipc'],
    env: {
      ...process.env,
      TSX_TSCONFIG_PATH: 'server/tsconfig.json',
      DATABASE_URL: databaseUrl,
      SMTP_URL: 'smtp://127.0.0.1:1',
      PUBLIC_URL,
      PORT: '0',
      SESSION_SECRET: 'only for the tests, and long enough',
      LOG_LEVEL: 'silent',
    },
  });
  const [message] = (await once(child, 'message')) as [{ readonly port?: number }];
  return {
    child,
    baseUrl: `http://127.0.0.1:${message.port ?? 0}`,
    kill: async () => {
      if (child.exitCode !== null || child.signalCode !== null) return;
      const gone = once(child, 'exit');
      child.kill('SIGKILL');
      await gone;
    },
  };
}
