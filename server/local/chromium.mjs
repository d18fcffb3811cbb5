import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';
import { canInstallPackages, installPackages } from './debian-packages.mjs';
import { UserError } from './log.mjs';

function findChromium() {
  if (process.env.CHROMIUM) return process.env.CHROMIUM;
  const folders = ['/usr/bin', ...(process.env.PATH ?? '').split(delimiter).filter(Boolean)];
  for (const folder of folders)
    for (const name of ['chromium', 'chromium-browser', 'google-chrome']) {
      const program = join(folder, name);
      try {
        accessSync(program, constants.X_OK);
        return program;
      } catch {
        continue; // not here: the next folder
      }
    }
  return null;
}

/** Path of a Chromium for the browser tests; installs Debian's when there is none and apt may be used. */
export function ensureChromium() {
  const found = findChromium();
  if (found) return found;
  if (canInstallPackages() && installPackages('chromium')) {
    const installed = findChromium();
    if (installed) return installed;
  }
  throw new UserError(
    'The browser tests need Chromium: install it (Debian: sudo apt-get install chromium) or set CHROMIUM to its path.',
  );
}
