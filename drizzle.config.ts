import { defineConfig } from 'drizzle-kit';

export default defineConfig({
  dialect: 'postgresql',
  schema: './server/db/schema',
  out: './server/migrations',
  casing: 'snake_case',
  strict: true,
});
