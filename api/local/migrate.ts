import { prepareDatabase } from '../platform/db/migrate';

// `npm run migrate`: for a database that is not the local one.
const { DATABASE_OWNER_URL: owner, DATABASE_URL: application } = process.env;
if (!owner || !application) {
  process.stderr.write('DATABASE_OWNER_URL and DATABASE_URL are needed: nothing was changed.\n');
  process.exit(1);
}
await prepareDatabase(owner, application);
process.stdout.write('Roles and tables are as this build needs them.\n');
