/** Writes server/db/schema.ts from the migrations: run `npm run db:types` after adding one; a test fails when it is stale. */
import { writeFileSync } from 'node:fs';
import { schemaText } from '../server/db/schemaText';

schemaText().then((text) => writeFileSync('server/db/schema.ts', text));
