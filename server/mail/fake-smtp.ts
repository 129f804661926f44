import { simpleParser, type AddressObject, type ParsedMail } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import type { Db } from '#server/db/connection';
import { keepDemoMail } from '#server/demo/mails.repository';

export interface FakeSmtp {
  /** For `SMTP_URL`. */
  readonly url: string;
  close(): Promise<void>;
}

const MAX_BYTES = 1024 * 1024;
const HOST = '127.0.0.1';

function addresses(field: AddressObject | AddressObject[] | undefined): string {
  const all = field === undefined ? [] : Array.isArray(field) ? field : [field];
  return all.map((one) => one.text).join(', ');
}

function readMail(parsed: ParsedMail, now: Date) {
  return {
    to: addresses(parsed.to),
    from: addresses(parsed.from),
    subject: parsed.subject ?? '',
    text: parsed.text ?? '',
    receivedAt: now,
  };
}

/** A mail server on this machine alone that delivers nothing: it keeps what it receives for the demonstration to show. */
export async function startFakeSmtp(db: Db, clock: () => Date, port = 0): Promise<FakeSmtp> {
  const server = new SMTPServer({
    size: MAX_BYTES,
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    onData: (stream, _session, done) => {
      simpleParser(stream)
        .then((parsed) => keepDemoMail(db, readMail(parsed, clock())))
        .then(
          () => done(),
          () => done(Object.assign(new Error('Not now'), { responseCode: 451 })),
        );
    },
  });
  // A sender that goes away in mid-mail is its own affair.
  server.on('error', () => undefined);
  await new Promise<void>((resolve, reject) => {
    server.server.once('error', reject);
    server.listen(port, HOST, resolve);
  });
  const address = server.server.address();
  if (address === null || typeof address === 'string') throw new Error('The mail server listens at no port.');
  return {
    url: `smtp://${HOST}:${address.port}`,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
