/** Finds a TCP port that nobody listens on. */
import { createServer } from 'node:net';

/** True when `port` can be listened on at `host`. */
export function isPortFree(port: number, host: string): Promise<boolean> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/**
 * The first free port at or after `wanted` (0: any free port).
 * Throws when none of the next 200 is free.
 */
export async function findFreePort(wanted: number, host = '127.0.0.1'): Promise<number> {
  if (wanted === 0) return anyFreePort(host);
  for (let port = wanted; port < wanted + 200 && port < 65536; port += 1) {
    if (await isPortFree(port, host)) return port;
  }
  throw new Error(`No free port between ${String(wanted)} and ${String(wanted + 199)} on ${host}.`);
}

function anyFreePort(host: string): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen({ port: 0, host }, () => {
      const address = probe.address();
      probe.close(() => {
        if (address !== null && typeof address === 'object') resolve(address.port);
        else reject(new Error(`No free port on ${host}.`));
      });
    });
  });
}
