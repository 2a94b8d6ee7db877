import net from 'node:net';

/**
 * Whether a MariaDB greets on this loopback port. Its port is open before it has run its init file,
 * but it greets only afterwards: so a greeting means that accounts and database exist.
 * @param {number} port
 * @param {number} [withinMs]
 * @returns {Promise<boolean>}
 */
export function speaksMariadb(port, withinMs = 2_000) {
  return new Promise((resolve) => {
    const socket = net.connect({ host: '127.0.0.1', port, timeout: withinMs });
    const answer = (/** @type {boolean} */ good) => {
      socket.destroy();
      resolve(good);
    };
    socket.once('data', (bytes) => answer(isGreeting(bytes)));
    socket.once('error', () => answer(false));
    socket.once('timeout', () => answer(false));
    socket.once('close', () => answer(false));
  });
}

/**
 * The first packet a server sends: 3 bytes length, sequence number 0, protocol version 10
 * (MariaDB documentation, "Initial Handshake Packet"). A refusal carries 0xff there instead.
 * @param {Uint8Array} bytes
 * @returns {boolean}
 */
export function isGreeting(bytes) {
  return bytes.length > 4 && bytes[3] === 0 && bytes[4] === 10;
}
