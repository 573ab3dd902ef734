import express, { type Response } from 'express';
import { isId } from '../../shared/ids';
import { notFound } from '../../shared/refusal';
import { SheetContent } from '../../shared/sheets/content';
import {
  changeSheetSettings,
  checkSheetPage,
  fetchKeys,
  issueSheet,
  listKeys,
  listSheets,
  previewSheet,
  printCheckedSheet,
  printSheet,
  readSheet,
  readSheetSettings,
  rotateKey,
  withdrawSheet,
} from '../../shared/sheets/contract';
import { importSheet, listImported, previewImport, readImported } from '../../shared/sheets/importContract';
import { keysAddress, sheetFileName } from '../../shared/sheets/sheetFile';
import type { Feature } from '../features';
import { limitOf } from '../http/limitOf';
import { sheetPdf } from '../print';
import { fetchedKeys } from './foreignKeys';
import { importedPage, importedRows } from './imported';
import { planImport } from './importPlan';
import { toldPlan } from './importPreview';
import { publishedKeys, rotate } from './keys';
import { setShowsPeople, showsPeople } from './people';
import { byToken, publicSheet } from './publicSheet';
import { readSource } from './readSource';
import { checkAddress, issue, preview, sheetPage, sheetRows, storedSheet, withdraw } from './sheets';
import { takeIn } from './takeIn';

export { currentKeyId, openKey } from './keys';
export { lineageTold } from './lineageTold';
export { issueInside, numberWords, sheetRows } from './sheets';
export { verifySheet } from './signing';

/** A sheet with some ten thousand ancestors, as it is sent in to be taken in. */
const LARGEST_SHEET = '6mb';

export const sheets: Feature = {
  before: (app) => {
    app.use('/api/rooms/:roomId/sheet-imports', express.json({ limit: LARGEST_SHEET, strict: true }));
  },
  routes: (serve) => {
    serve.read(listSheets, async (scope, { query }) => ({ sheets: await sheetRows(scope, query) }));
    serve.read(previewSheet, async (scope, { query }) => ({ content: await preview(scope, query) }));
    serve.work(issueSheet, (scope, { body }) => issue(scope, body));
    serve.read(readSheet, (scope, { params }) => sheetPage(scope, params.sheetId));
    serve.write(withdrawSheet, (scope, { params, body }) => withdraw(scope, params.sheetId, body));
    serve.read(listKeys, async (scope) => ({
      keysAt: keysAddress(scope.house.config.origin, scope.roomId),
      keys: await scope.db
        .selectFrom('roomKey')
        .where('roomId', '=', scope.roomId)
        .select(['id', 'createdAt', 'retiredAt'])
        .orderBy('createdAt', 'desc')
        .execute(),
    }));
    serve.read(readSheetSettings, async (scope) => ({ showPeople: await showsPeople(scope) }));
    serve.write(changeSheetSettings, (scope, { body }) => setShowsPeople(scope, body.showPeople));
    serve.write(rotateKey, async (scope) => ({ id: await rotate(scope) }));
    serve.read(printSheet, async (scope, { params }, { res }) => {
      const { content, token } = await storedSheet(scope, params.sheetId);
      sendPdf(
        res,
        content,
        await sheetPdf(content, params.paper, { checkUrl: checkAddress(scope.house.config.origin, token) }),
      );
      return null;
    });
    serve.open(checkSheetPage, async (asked, { params }, { res }) => {
      keepFromSearch(res);
      return publicSheet(asked, params.token);
    });
    const imports = limitOf(120, 15);
    serve.work(previewImport, async (scope, { body }, raw) => {
      await imports(raw, scope.roomId);
      const read = await readSource(scope, body.source);
      return toldPlan(scope, read, await planImport(scope, read));
    });
    serve.work(importSheet, (scope, { body }) => takeIn(scope, body));
    serve.read(listImported, async (scope, { query }) => ({ sheets: await importedRows(scope, query) }));
    serve.read(readImported, (scope, { params }) => importedPage(scope, params.importId));
    const fetches = limitOf(30, 15);
    serve.open(fetchKeys, async (asked, { body }, raw) => {
      await fetches(raw);
      return fetchedKeys(asked, body.at);
    });
    serve.open(printCheckedSheet, async (asked, { params }, { res }) => {
      const { content } = await byToken(asked.db, params.token);
      keepFromSearch(res);
      const sheet = SheetContent.parse(JSON.parse(content));
      sendPdf(
        res,
        sheet,
        await sheetPdf(sheet, params.paper, { checkUrl: checkAddress(asked.house.config.origin, params.token) }),
      );
      return null;
    });
  },
  pages: (app, house) => {
    app.use('/sheet', (_req, res, next) => {
      keepFromSearch(res);
      next();
    });
    // Published for anyone, on any site: other installations check our sheets by them.
    app.get('/keys/:file', async (req, res) => {
      const roomId = /^([0-9a-f-]{36})\.json$/.exec(req.params.file)?.[1] ?? '';
      const published = isId(roomId) ? await publishedKeys({ db: house.db, roomId }) : null;
      if (!published || published.keys.length === 0) throw notFound('Those keys');
      res.set({ 'Cache-Control': 'public, max-age=300', 'Access-Control-Allow-Origin': '*' }).json(published);
    });
  },
};

function keepFromSearch(res: Response): void {
  res.set({ 'X-Robots-Tag': 'noindex', 'Referrer-Policy': 'no-referrer' });
}

function sendPdf(res: Response, content: SheetContent, pdf: Buffer): void {
  const name = sheetFileName(content.issue.number).replace('.kinwater.json', '.pdf');
  res.set({
    'Content-Type': 'application/pdf',
    'Content-Disposition': `inline; filename="${name}"`,
    'Cache-Control': 'private, no-store',
  });
  res.send(pdf);
}
