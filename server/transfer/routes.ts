import { join } from 'node:path';
import type { Response } from 'express';
import { DONE } from '../../shared/endpoint';
import {
  askDeletion,
  cancelDeletion,
  checkIntegrity,
  deleteAccount as deleteMine,
  exportArchive,
  exportTables,
  importArchive,
  listImports,
  previewImport,
  readDeletion,
  runImport,
  undoImport,
} from '../../shared/transfer/contract';
import type { Serve } from '../http/serve';
import { endSession } from '../http/session';
import type { Scope } from '../scope';
import { DATABASE } from './backup';
import { deleteAccount } from './deleteAccount';
import { askToDelete, callOff, deletionOf } from './deleteRoom';
import { writeArchive } from './exportArchive';
import { writeTables } from './exportTables';
import { checkFile } from './fileCheck';
import { importArchive as bringIn } from './importArchive';
import { preview, run } from './importCsv';
import { importsOf, takeBack } from './importUndo';
import { contentReport } from './integrity';
import { receiveFile } from './receiveFile';

export function transferRoutes(serve: Serve): void {
  serve.work(checkIntegrity, async ({ db, house, roomId }) => {
    const database = await checkFile(join(house.config.dataFolder, DATABASE));
    return { ...database, ...(await contentReport(db, (rows) => house.pictures.report(rows, roomId), roomId)) };
  });
  serve.work(exportArchive, async (scope, _input, { res }) => {
    asZip(res, `kinwater-${scope.today}-archive.zip`);
    await cutOffIfItFails(scope, res, () => writeArchive(scope.house, scope.roomId, scope.now, res));
    return null;
  });
  serve.work(exportTables, async (scope, _input, { res }) => {
    asZip(res, `kinwater-${scope.today}-tables.zip`);
    await cutOffIfItFails(scope, res, () => writeTables(scope.house, scope.roomId, scope.now, res));
    return null;
  });
  serve.signedIn(importArchive, (asked, _input, raw) =>
    receiveFile(asked.house, raw, asked.house.config.roomQuotaBytes + 300_000_000, (file) => bringIn(asked, file)),
  );
  serve.work(previewImport, (scope, { body }) => preview(scope, body));
  serve.work(runImport, (scope, { body }) => run(scope, body));
  serve.read(listImports, (scope) => importsOf(scope));
  serve.write(undoImport, (scope, { params }) => takeBack(scope, params.importId));
  serve.read(readDeletion, (scope) => deletionOf(scope));
  serve.write(askDeletion, (scope, { body }) => askToDelete(scope, body.name));
  serve.write(cancelDeletion, (scope) => callOff(scope));
  serve.signedIn(deleteMine, async (asked, { body }, { req, res }) => {
    await deleteAccount(asked, body.current);
    await endSession(asked, req, res);
    return DONE;
  });
}

function asZip(res: Response, name: string): void {
  res.set({ 'Content-Type': 'application/zip', 'Content-Disposition': `attachment; filename="${name}"` });
}

/** Once bytes have gone out no status can say that it failed: the connection is broken off, so that no half file passes for whole. */
async function cutOffIfItFails({ log }: Scope, res: Response, work: () => Promise<void>): Promise<void> {
  try {
    await work();
  } catch (error) {
    log.error(
      { event: 'export failed', error: error instanceof Error ? error.message : String(error) },
      'export failed',
    );
    res.destroy();
  }
}
