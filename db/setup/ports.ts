import { createServer } from 'node:net';

/** A port of the loopback address that nothing listens on right now. */
export function freePort(): Promise<number> {
  return listenOnce(0);
}

/** Whether something else already listens on this port of this address. */
export async function isPortTaken(port: number, host = '127.0.0.1'): Promise<boolean> {
  try {
    await listenOnce(port, host);
    return false;
  } catch {
    return true;
  }
}

function listenOnce(port: number, host = '127.0.0.1'): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen({ port, host, exclusive: true }, () => {
      const address = server.address();
      server.close(() => resolve(typeof address === 'object' && address ? address.port : port));
    });
  });
}
