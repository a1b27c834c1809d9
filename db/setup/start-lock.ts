import { createHash } from 'node:crypto';
import { connect, createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { dataFolder } from './paths';
import { SetupError } from './run';

export interface Holder {
  readonly pid: number;
  readonly url: string;
}

/**
 * Lets one start use a data folder at a time. The lock is a local socket: the kernel gives it to one
 * process and takes it back when that ends, however it ends, so it can never be stale; and the
 * holder can be asked where it serves.
 * @returns how to let go of it
 * @throws {SetupError} naming the start that holds it
 */
export async function takeStartLock(holder: Holder, folder = dataFolder): Promise<() => void> {
  const address = lockAddress(folder);
  const server = createServer((socket) => {
    socket.on('error', () => {});
    socket.end(JSON.stringify(holder));
  });
  server.unref();
  const taken = await new Promise<boolean>((resolve) => {
    server.once('error', () => resolve(false));
    server.listen(address, () => resolve(true));
  });
  if (taken) return () => server.close();
  const other = await askHolder(address);
  throw new SetupError(
    other
      ? `Valveside already runs from this folder: ${other.url} (process ${other.pid}).\nStop it first, or open that address.`
      : 'Another start of Valveside holds this folder and does not answer. Stop it first.',
  );
}

function lockAddress(folder: string): string {
  const name = `valveside-${createHash('sha256').update(folder).digest('hex').slice(0, 24)}`;
  // Linux has sockets without a file; elsewhere the file may need removing after a kill.
  return process.platform === 'linux' ? `\0${name}` : join(tmpdir(), `${name}.sock`);
}

function askHolder(address: string): Promise<Holder | undefined> {
  return new Promise((resolve) => {
    let text = '';
    const socket = connect(address);
    socket.setTimeout(2000, () => socket.destroy());
    socket.on('data', (chunk) => {
      text += chunk;
    });
    socket.on('error', () => {});
    socket.on('close', () => {
      try {
        resolve(JSON.parse(text));
      } catch {
        resolve(undefined);
      }
    });
  });
}
