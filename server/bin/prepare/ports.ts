import { createConnection, createServer } from 'node:net';

/** Whether nothing listens on this port of 127.0.0.1. */
export function isPortFree(port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const probe = createServer();
    // Any other error, such as a port reserved for root, is for the one who really listens to report.
    probe.once('error', (error: NodeJS.ErrnoException) => resolve(error.code !== 'EADDRINUSE'));
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(true)));
  });
}

/** A port of 127.0.0.1 that nothing listens on just now. */
export function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      const port = typeof address === 'object' && address ? address.port : 0;
      probe.close(() => resolve(port));
    });
  });
}

/** Whether a MariaDB server greets on this port: its handshake is a packet whose fifth byte is the protocol version, 10. */
export function databaseGreets(port: number, withinMs = 1000): Promise<boolean> {
  return new Promise((resolve) => {
    const socket = createConnection({ port, host: '127.0.0.1' });
    const answer = (yes: boolean) => {
      clearTimeout(timer);
      socket.destroy();
      resolve(yes);
    };
    const timer = setTimeout(() => answer(false), withinMs);
    socket.once('error', () => answer(false));
    socket.once('close', () => answer(false));
    socket.once('data', (bytes) => answer(bytes.length > 4 && bytes[4] === 10));
  });
}
