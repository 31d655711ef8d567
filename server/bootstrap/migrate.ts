import { migrate } from '#server/db/migrate.ts';

const { MIGRATION_DATABASE_URL: ownerUrl, APP_ROLE: appRole } = process.env;
if (!ownerUrl || !appRole) throw new Error('MIGRATION_DATABASE_URL and APP_ROLE must be set');
const applied = await migrate(ownerUrl, appRole);
console.log(applied.length === 0 ? 'up to date' : `${applied.length} migrations`);
