import nodemailer from 'nodemailer';

export type Letter = {
  to: string | { name: string; address: string };
  subject: string;
  text: string;
  html: string;
  attachments?: { filename: string; contentType: string; content: Buffer | string }[];
  headers?: Record<string, string>;
};

export type Mailer = {
  /** Hands a letter to the mail server; throws when it is not taken. */
  send(letter: Letter): Promise<void>;
  close(): void;
};

/** One SMTP connection pool; the local sink and a real server are spoken to alike. */
export function openMailer(smtpUrl: string, from: string): Mailer {
  const transport = nodemailer.createTransport(
    {
      url: smtpUrl,
      pool: true,
      maxConnections: 2,
      connectionTimeout: 5000,
      greetingTimeout: 5000,
      socketTimeout: 10_000,
    },
    { from },
  );
  return {
    send: async (letter) => {
      await transport.sendMail(letter);
    },
    close: () => transport.close(),
  };
}
