import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { findCode } from './mail-folder';

export interface ReceivedMail {
  readonly to: readonly string[];
  readonly subject: string;
  readonly file: string;
  /** The sign-in code in it, when there is one. */
  readonly code: string | undefined;
}

export interface MailFake {
  readonly url: string;
  stop(): Promise<void>;
}

export interface MailFakeOptions {
  /** Every message is kept here as `.eml`. */
  readonly folder: string;
  readonly port?: number;
  readonly onMail?: (mail: ReceivedMail) => void;
}

/** A mail server on loopback that delivers nothing and keeps everything. */
export async function startMailFake(options: MailFakeOptions): Promise<MailFake> {
  mkdirSync(options.folder, { recursive: true, mode: 0o700 });
  const server = new SMTPServer({
    authOptional: true,
    hideSTARTTLS: true,
    disableReverseLookup: true,
    onData(stream, session, done) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        const to = session.envelope.rcptTo.map(({ address }) => address);
        keep(options, Buffer.concat(chunks), to).then(() => done(), done);
      });
    },
  });
  // A client that hangs up in the middle is no reason to stop.
  server.on('error', () => {});
  const port = await listen(server, options.port ?? 0);
  return {
    url: `smtp://127.0.0.1:${port}`,
    stop: () => new Promise<void>((resolve) => server.close(resolve)),
  };
}

function listen(server: SMTPServer, port: number): Promise<number> {
  return new Promise((resolve, reject) => {
    const listening = server.listen(port, '127.0.0.1', () => {
      const address = listening.address();
      resolve(typeof address === 'object' && address ? address.port : port);
    });
    listening.once('error', reject);
  });
}

let received = 0;

async function keep(options: MailFakeOptions, message: Buffer, to: string[]): Promise<void> {
  const parsed = await simpleParser(message);
  received += 1;
  const time = new Date().toISOString().replace(/[:.]/g, '-');
  const name = (to[0] ?? 'nobody').replace(/[^a-zA-Z0-9@._+-]/g, '_').slice(0, 100);
  const count = String(received).padStart(5, '0');
  const file = join(options.folder, `${time}-${count}-${name}.eml`);
  writeFileSync(file, message, { mode: 0o600 });
  options.onMail?.({ to, subject: parsed.subject ?? '', file, code: findCode(parsed.text ?? '') });
}
