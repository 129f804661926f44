import type { Logger } from 'pino';
import type { Db } from '#server/db/connection';
import { describeError } from '#server/http/describe-error';
import {
  claimDueMails,
  markGivenUp,
  markSent,
  putOff,
  type OutboxMail,
} from '#server/mail/outbox.repository';
import { readSender, type Transport } from '#server/mail/transport';

/** Drains the outbox. */
export interface MailSender {
  /** Something was put into the outbox: do not wait for the next round. */
  kick(): void;
  stop(): Promise<void>;
}

interface SenderDeps {
  readonly db: Db;
  readonly log: Logger;
  readonly clock: () => Date;
  readonly transport: Transport;
  readonly mailFrom: string;
}

const ROUND_MS = 5000;
const FIRST_PAUSE_MS = 15_000;
const LONGEST_PAUSE_MS = 60 * 60 * 1000;
/** With the pauses above about a day of trying. */
const MOST_ATTEMPTS = 32;

function pauseAfter(attempts: number): number {
  return Math.min(LONGEST_PAUSE_MS, FIRST_PAUSE_MS * 2 ** (attempts - 1));
}

/** What was refused is this mail, its sender, recipient or text; a refused sign-in (535) is for us to mend. */
const MAIL_REFUSED: ReadonlySet<unknown> = new Set(['EENVELOPE', 'EMESSAGE']);

/** The server's answer code (550, 451) or the connection's fault; never its text, which may quote the mail. */
function faultOf(error: unknown): { name: string; final: boolean } {
  const read = (key: string): unknown => (error instanceof Error ? Reflect.get(error, key) : undefined);
  const [answer, code] = [read('responseCode'), read('code')];
  if (typeof answer === 'number')
    return { name: String(answer), final: answer >= 500 && answer < 600 && MAIL_REFUSED.has(code) };
  return { name: typeof code === 'string' ? code.slice(0, 40) : 'UNKNOWN', final: false };
}

async function send({ transport, mailFrom }: SenderDeps, mail: OutboxMail): Promise<void> {
  const from = readSender(mailFrom);
  await transport.sendMail({
    from,
    // As an object: in a string a comma would make two recipients.
    to: { name: mail.toName, address: mail.toEmail },
    subject: mail.subject,
    text: mail.text,
    html: mail.html,
    // The same at every try, so that a mailbox can tell a repetition.
    messageId: `<${mail.id}@${from.address.split('@')[1] ?? 'siltline'}>`,
    headers: { 'Auto-Submitted': 'auto-generated' },
  });
}

async function deliver(deps: SenderDeps, mail: OutboxMail): Promise<void> {
  const { db, log, clock } = deps;
  const attempts = mail.attempts + 1;
  try {
    await send(deps, mail);
  } catch (error) {
    const { name, final } = faultOf(error);
    log.warn({ mail: mail.id, fault: name, attempts }, 'a mail was not taken');
    if (final || attempts >= MOST_ATTEMPTS) return markGivenUp(db, mail.id, name, clock());
    return putOff(db, mail.id, name, new Date(clock().getTime() + pauseAfter(attempts)));
  }
  await markSent(db, mail.id, clock());
}

async function drain(deps: SenderDeps): Promise<void> {
  for (;;) {
    const mails = await claimDueMails(deps.db, deps.clock());
    if (mails.length === 0) return;
    await Promise.all(mails.map((mail) => deliver(deps, mail)));
  }
}

export function startMailSender(deps: SenderDeps): MailSender {
  let running: Promise<void> | null = null;
  let again = false;
  let stopped = false;

  const round = async (): Promise<void> => {
    do {
      again = false;
      // The database or the mail server may be away: the outbox keeps what is due until the next round.
      await drain(deps).catch((error: unknown) => {
        deps.log.warn({ fault: describeError(error) }, 'the outbox could not be drained');
      });
    } while (again && !stopped);
    running = null;
  };
  const kick = () => {
    again = true;
    if (!stopped) running ??= round();
  };
  const timer = setInterval(kick, ROUND_MS);
  timer.unref();
  return {
    kick,
    stop: async () => {
      stopped = true;
      clearInterval(timer);
      await running;
      deps.transport.close();
    },
  };
}
