import { defineConfig } from 'drizzle-kit';

/** Only for `drizzle-kit generate`: migrations are applied by api/platform/db/migrate.ts. */
export default defineConfig({
  dialect: 'postgresql',
  schema: './api/platform/db/schema/*.ts',
  out: './api/platform/db/migrations',
  casing: 'snake_case',
});
