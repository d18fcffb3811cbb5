import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';

function* filesUnder(path) {
  if (!statSync(path).isDirectory()) {
    yield path;
    return;
  }
  for (const entry of readdirSync(path).sort()) yield* filesUnder(join(path, entry));
}

/** SHA-256 over the names and bytes of files and folders: it changes when, and only when, one of them does. */
export function treeHash(root, ...paths) {
  const hash = createHash('sha256');
  for (const path of paths)
    for (const file of filesUnder(join(root, path)))
      hash.update(`${file}\0`).update(readFileSync(file)).update('\0');
  return hash.digest('hex');
}
