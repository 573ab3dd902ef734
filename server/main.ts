import { createServer } from 'node:http';
import { appOf } from './app';
import { buildHouse } from './buildHouse';
import { readConfig } from './config';
import { features } from './features';

async function main(): Promise<void> {
  const config = readConfig();
  const { house, close } = await buildHouse(config);
  const running: ({ stop(): Promise<void> } | undefined)[] = [];
  for (const feature of features) running.push(await feature.start?.(house));
  const server = createServer({ maxHeaderSize: 16_384 }, appOf(house));
  server.requestTimeout = 120_000;
  await new Promise<void>((ready, failed) => {
    server.once('error', failed);
    server.listen(config.port, config.host, ready);
  });
  house.log.info({ event: 'started', origin: config.origin }, `Kinwater is at ${config.origin}`);
  const letters = house.sink ? `Letters it sends: ${config.origin}/dev/letters\n` : '';
  if (!config.production) process.stdout.write(`\nKinwater is at ${config.origin}\n${letters}${house.demoWords}\n`);

  let stopping = false;
  const stop = async (signal: string) => {
    if (stopping) return;
    stopping = true;
    house.log.info({ event: 'stopping', signal }, 'stopping');
    const closed = new Promise((done) => server.close(done));
    server.closeIdleConnections();
    // Whoever is in the middle of a save is let finish.
    await Promise.race([closed, new Promise((late) => setTimeout(late, 8000).unref())]);
    for (const one of running) await one?.stop();
    await close();
    process.exit(0);
  };
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => void stop(signal));
}

main().catch((error: unknown) => {
  process.stderr.write(`Kinwater did not start: ${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
