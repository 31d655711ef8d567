import { existsSync } from 'node:fs';
import { isRoot } from './places.mjs';
import { aptInstall } from './postgres-server.mjs';

/** What the tests use of Debian: a browser, and a second program that writes EXIF. */
const NEEDED = [
  { program: '/usr/bin/chromium', debian: 'chromium' },
  { program: '/usr/bin/exiftool', debian: 'libimage-exiftool-perl' },
];

/** @throws Error naming the packages when they are missing and we may not install them */
export async function testPrograms() {
  const missing = NEEDED.filter(({ program }) => !existsSync(program)).map(({ debian }) => debian);
  if (missing.length === 0) return 'there already';
  if (!isRoot) throw new Error(`The tests need Debian’s packages ${missing.join(' and ')} (as root: apt-get install ${missing.join(' ')}).`);
  await aptInstall(...missing);
  return `installed ${missing.join(', ')}`;
}
