import * as z from 'zod';
import { migrateDatabase } from './database/migrate-database';

const { DATABASE_URL } = z.object({ DATABASE_URL: z.url() }).parse(process.env);
const applied = await migrateDatabase(DATABASE_URL);
if (applied.length > 0) console.error(`Applied migrations: ${applied.join(', ')}`);
