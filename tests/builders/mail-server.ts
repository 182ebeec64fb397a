import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { SMTPServer, type SMTPServerAddress } from 'smtp-server';

export type Received = { readonly to: readonly string[]; readonly messageId: string; readonly source: string };

/** What the server says to a mail instead of taking it: a code and its words, or an end of the conversation without a word. */
export type Refusal = { readonly code: number; readonly said: string } | 'hang-up' | null;

export type MailServer = {
  readonly url: string;
  readonly port: number;
  readonly received: readonly Received[];
  /** Resolves when so many mails in all have come. */
  readonly until: (count: number) => Promise<void>;
  readonly close: () => Promise<void>;
};

export type MailServerPlan = {
  readonly port?: number;
  /** Asked when a recipient is named. */
  readonly onRecipient?: (address: string) => Refusal;
  /** Asked when the whole mail has come; the answer waits for it. */
  readonly onMail?: (mail: Received) => Refusal | Promise<Refusal>;
};

/** A mail server of this test on loopback that remembers what it took, and refuses what it is told to. */
export async function openMailServer({ port = 0, onRecipient, onMail }: MailServerPlan = {}): Promise<MailServer> {
  const received: Received[] = [];
  const waiting = new Set<() => void>();
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    closeTimeout: 200,
    disableReverseLookup: true,
    onRcptTo({ address }: SMTPServerAddress, _session, done) {
      done(errorOf(onRecipient?.(address) ?? null));
    },
    onData(stream, session, done) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        const source = Buffer.concat(chunks).toString('latin1');
        const mail = {
          to: session.envelope.rcptTo.map(({ address }) => address),
          messageId: /^Message-ID: (.+)\r$/im.exec(source)?.[1] ?? '',
          source,
        };
        void Promise.resolve(onMail?.(mail) ?? null).then((refusal) => {
          if (refusal === null) received.push(mail);
          for (const tell of [...waiting]) tell();
          done(errorOf(refusal));
        });
      });
    },
  });
  server.on('error', () => undefined);
  server.listen(port, '127.0.0.1');
  await once(server.server, 'listening');
  const { port: got } = server.server.address() as AddressInfo;
  return {
    url: `smtp://127.0.0.1:${got}`,
    port: got,
    received,
    until: (count) =>
      new Promise((resolve) => {
        const tell = (): void => {
          if (received.length < count) return;
          waiting.delete(tell);
          resolve();
        };
        waiting.add(tell);
        tell();
      }),
    close: () =>
      new Promise((resolve) => {
        server.close(() => {
          resolve();
        });
      }),
  };
}

function errorOf(refusal: Refusal): Error | null {
  if (refusal === null) return null;
  if (refusal === 'hang-up') return Object.assign(new Error('Bye'), { responseCode: 421 });
  return Object.assign(new Error(refusal.said), { responseCode: refusal.code });
}
