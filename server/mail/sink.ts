import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';

export type SunkLetter = {
  id: number;
  at: string;
  to: string;
  subject: string;
  text: string;
  html: string;
  headers: Record<string, string>;
  attachments: { filename: string; contentType: string; content: Buffer }[];
};

export type Sink = { url: string; letters: SunkLetter[]; close(): Promise<void> };

const KEPT = 500;

/** A real SMTP server on this machine that keeps letters instead of sending them. Never in production. */
export async function openSink(): Promise<Sink> {
  const letters: SunkLetter[] = [];
  let count = 0;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    onData(stream, _session, done) {
      simpleParser(stream).then((mail) => {
        count += 1;
        const to = Array.isArray(mail.to) ? mail.to : mail.to ? [mail.to] : [];
        letters.push({
          id: count,
          at: new Date().toISOString(),
          to: to.map((one) => one.text).join(', '),
          subject: mail.subject ?? '',
          text: mail.text ?? '',
          html: mail.html || '',
          headers: Object.fromEntries(
            mail.headerLines.map(({ key, line }) => [key, line.slice(key.length + 1).trim()]),
          ),
          attachments: mail.attachments.map((one) => ({
            filename: one.filename ?? 'attachment',
            contentType: one.contentType,
            content: one.content,
          })),
        });
        if (letters.length > KEPT) letters.shift();
        done();
      }, done);
    },
  });
  await new Promise<void>((ready, failed) => {
    server.once('error', failed);
    server.listen(0, '127.0.0.1', () => ready());
  });
  const address = server.server.address();
  if (address === null || typeof address === 'string') throw new Error('The local mail sink has no port');
  return {
    url: `smtp://127.0.0.1:${address.port}`,
    letters,
    close: () => new Promise((closed) => server.close(() => closed())),
  };
}
