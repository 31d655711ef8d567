import { loadDemo } from '#server/demo/load.ts';

const { MIGRATION_DATABASE_URL: ownerUrl, UPLOADS_DIR: uploadsDir = 'uploads', DEMO_TODAY: today = new Date().toISOString().slice(0, 10) } = process.env;
if (!ownerUrl) throw new Error('MIGRATION_DATABASE_URL must be set');
const { loaded } = await loadDemo(ownerUrl, { today, uploadsDir, report: (line) => void process.stderr.write(`${line}\n`) });
console.log(loaded ? 'loaded' : 'not needed');
