import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import { delimiter, dirname, join } from 'node:path';
import { canInstallPackages, installPackages } from './debian-packages.mjs';
import { UserError } from './log.mjs';

const OLDEST_MAJOR = 14;
const PROGRAMS = ['initdb', 'postgres', 'pg_ctl', 'psql'];
/** Where packagers put them: base folder, name of a version's folder, rest of the path. */
const HOMES = [
  ['/usr/lib/postgresql', /^\d+$/, 'bin'], // Debian, Ubuntu
  ['/usr', /^pgsql-\d+$/, 'bin'], // Red Hat and kin
  ['/opt/homebrew/opt', /^postgresql(@\d+)?$/, 'bin'], // macOS
  ['/usr/local/opt', /^postgresql(@\d+)?$/, 'bin'],
];

function candidateFolders() {
  if (process.env.PG_BIN_DIR) return [process.env.PG_BIN_DIR];
  const versioned = HOMES.filter(([base]) => existsSync(base)).flatMap(([base, name, rest]) =>
    readdirSync(base)
      .filter((entry) => name.test(entry))
      .map((entry) => join(base, entry, rest)),
  );
  return [...versioned, ...(process.env.PATH ?? '').split(delimiter).filter(Boolean)];
}

function findPostgres() {
  const found = [];
  for (const folder of candidateFolders()) {
    if (!PROGRAMS.every((program) => existsSync(join(folder, program)))) continue;
    const answer = spawnSync(join(folder, 'postgres'), ['--version'], { encoding: 'utf8' }).stdout;
    const major = Number(/(\d+)/.exec(answer ?? '')?.[1]);
    if (major >= OLDEST_MAJOR) found.push({ folder, major });
  }
  return found.sort((a, b) => b.major - a.major)[0] ?? null;
}

/**
 * Folder and major version of PostgreSQL's programs; installs Debian's package when there are none and apt may be used.
 */
export function ensurePostgres() {
  const found = findPostgres();
  if (found) return found;
  if (canInstallPackages() && !process.env.PG_BIN_DIR) {
    // Debian's package makes and starts a cluster of its own: only the programs are wanted
    const settings = '/etc/postgresql-common/createcluster.conf';
    if (!existsSync(settings)) {
      mkdirSync(dirname(settings), { recursive: true });
      writeFileSync(settings, 'create_main_cluster = false\n');
    }
    const installed = installPackages('postgresql') && findPostgres();
    if (installed) return installed;
  }
  throw new UserError(
    `PostgreSQL ${OLDEST_MAJOR} or newer is needed: install it (Debian: sudo apt-get install postgresql), ` +
      'or set PG_BIN_DIR to the folder of its programs, or DATABASE_URL to a server that runs already.',
  );
}
