import { join } from 'node:path';
import { checkIntegrity } from '../../shared/transfer/contract';
import type { Serve } from '../http/serve';
import { DATABASE } from './backup';
import { checkFile } from './fileCheck';
import { contentReport } from './integrity';

export function transferRoutes(serve: Serve): void {
  serve.work(checkIntegrity, async ({ db, house, roomId }) => {
    const database = await checkFile(join(house.config.dataFolder, DATABASE));
    return { ...database, ...(await contentReport(db, (rows) => house.pictures.report(rows, roomId), roomId)) };
  });
}
