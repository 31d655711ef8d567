import { existsSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { isRoot } from './places.mjs';
import { plainEnvironment, run } from './run.mjs';

const DEBIAN = '/usr/lib/postgresql';

function newestDebianBin() {
  if (!existsSync(DEBIAN)) return undefined;
  const versions = readdirSync(DEBIAN).filter((name) => existsSync(path.join(DEBIAN, name, 'bin', 'initdb')));
  versions.sort((a, b) => Number(b) - Number(a));
  return versions[0] && path.join(DEBIAN, versions[0], 'bin');
}

function binOnPath() {
  return (process.env.PATH ?? '').split(path.delimiter).find((folder) => folder && existsSync(path.join(folder, 'initdb')));
}

/** Installs Debian packages as root, quietly. */
export async function aptInstall(...packages) {
  const env = plainEnvironment({ DEBIAN_FRONTEND: 'noninteractive' });
  await run('apt-get', ['update'], { env });
  await run('apt-get', ['install', '-y', '--no-install-recommends', ...packages], { env });
}

/**
 * Folder of the PostgreSQL server's programs; installs Debian's package when it is missing and we may.
 *
 * @throws Error that names the package
 */
export async function postgresBin() {
  const found = newestDebianBin() ?? binOnPath();
  if (found) return found;
  if (!isRoot || !existsSync('/usr/bin/apt-get')) {
    throw new Error('Loafmark needs a PostgreSQL server.\nInstall Debian’s package (as root: apt-get install postgresql), or set DATABASE_URL to a server that is there.');
  }
  await aptInstall('postgresql');
  const installed = newestDebianBin();
  if (!installed) throw new Error('Debian’s package postgresql was installed, but its programs are not where they should be (/usr/lib/postgresql).');
  return installed;
}
