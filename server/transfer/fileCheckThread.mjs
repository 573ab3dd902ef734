// A thread starts as plain JavaScript; from here on it reads TypeScript as the server itself does.
import { workerData } from 'node:worker_threads';
import { tsImport } from 'tsx/esm/api';

const { checkInThread } = await tsImport('./fileCheck.ts', import.meta.url);
await checkInThread(workerData);
