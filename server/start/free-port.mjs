// @ts-check
import { createServer } from 'node:net';

/**
 * A port that nothing listens on at this moment. Another program can still take it first: who uses it tries again.
 * @returns {Promise<number>}
 */
export function freePort() {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      server.close(() => {
        if (address !== null && typeof address === 'object') resolve(address.port);
        else reject(new Error('The system gave no port.'));
      });
    });
  });
}

/**
 * Why this port can't be listened on (a system error code such as EADDRINUSE), or undefined when it can.
 * @param {string} host
 * @param {number} port
 * @returns {Promise<string | undefined>}
 */
export function portHindrance(host, port) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', (/** @type {NodeJS.ErrnoException} */ error) => resolve(error.code ?? error.message));
    server.listen(port, host, () => server.close(() => resolve(undefined)));
  });
}
