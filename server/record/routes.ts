import { listEntries, recordEntry, undoEntry } from '../../shared/record/contract';
import type { Serve } from '../http/serve';
import { entriesOf, keepEntry, lineOf } from './record';
import { undo } from './undo';

export function recordRoutes(serve: Serve): void {
  serve.write(recordEntry, async (scope, { body }) => {
    await keepEntry(scope, body);
    return lineOf(scope, body.id);
  });
  serve.write(undoEntry, async (scope, { params }) => {
    await undo(scope, params.entryId);
    return lineOf(scope, params.entryId);
  });
  serve.read(listEntries, async (scope, { query }) => ({ entries: await entriesOf(scope, query) }));
}
