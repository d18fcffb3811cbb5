import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { log } from './log.mjs';

/** Whether this process may install Debian packages: the system is Debian's and we are root. */
export const canInstallPackages = () =>
  existsSync('/etc/debian_version') && existsSync('/usr/bin/apt-get') && process.getuid?.() === 0;

/** Installs packages without a question; answers whether it worked. Output goes to standard error. */
export function installPackages(...names) {
  log(`installing ${names.join(', ')} with apt-get`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const apt = (...args) =>
    spawnSync('apt-get', args, { stdio: ['ignore', 2, 2], env }).status === 0;
  // --force-confold: a configuration file that stands is kept, and nothing is asked
  const install = () =>
    apt(
      'install',
      '-y',
      '--no-install-recommends',
      '-o',
      'Dpkg::Options::=--force-confold',
      ...names,
    );
  return install() || (apt('update') && install());
}
