import net from 'node:net';

/**
 * A loopback port nobody listens on: the preferred one when it is free, else any.
 * @param {number} [preferred]
 * @returns {Promise<number>}
 */
export async function freePort(preferred = 0) {
  return (
    (await tryPort(preferred)) ?? (await tryPort(0)) ?? Promise.reject(new Error('no free port'))
  );
}

/** @param {number} port @returns {Promise<number | undefined>} */
function tryPort(port) {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once('error', () => resolve(undefined));
    probe.listen({ host: '127.0.0.1', port, exclusive: true }, () => {
      const address = probe.address();
      probe.close(() => resolve(typeof address === 'object' && address ? address.port : undefined));
    });
  });
}
