// The start command on a throw-away database, for the browser tests: same processes, nothing kept.
import path from 'node:path';
import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { startThrowawayCluster } from '../../server/local/cluster.mjs';
import { ensurePostgres } from '../../server/local/postgres-programs.mjs';

const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
const cluster = await startThrowawayCluster(ensurePostgres(), path.join(root, '.local'));
const child = spawn(process.execPath, [path.join(root, 'server/local/start.mjs')], {
  stdio: 'inherit',
  env: { ...process.env, DATABASE_URL: cluster.url },
});
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => child.kill(signal));
child.once('exit', (code) => {
  cluster.stop();
  process.exit(code ?? 1);
});
