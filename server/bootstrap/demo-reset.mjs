import { rmSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { dropLocalDatabase } from './database.mjs';
import { installPackages } from './packages.mjs';
import { ROOT } from './places.mjs';
import { prepare } from './prepare.mjs';
import { step } from './progress.mjs';
import { end, endOnSignals } from './shutdown.mjs';

endOnSignals();
try {
  if (process.env.DATABASE_URL || process.env.NODE_ENV === 'production') {
    throw new Error('demo:reset throws away the whole local database; it never touches one named by DATABASE_URL or a production one.');
  }
  console.log('\nLoafmark, the demo anew');
  await step('Packages', installPackages);
  await step('Old data', async () => {
    await dropLocalDatabase();
    const uploads = process.env.UPLOADS_DIR ?? path.join(ROOT, 'uploads');
    for (const name of readdirSync(uploads)) if (name !== '.gitkeep') rmSync(path.join(uploads, name), { recursive: true });
    return 'gone';
  });
  await prepare({ withClient: false });
  await end(0);
} catch (error) {
  console.error(`\n${error instanceof Error ? error.message : String(error)}\n`);
  await end(1);
}
