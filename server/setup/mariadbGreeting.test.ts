import net from 'node:net';
import { afterEach, expect, test } from 'vitest';
import { isGreeting, speaksMariadb } from './mariadbGreeting.mjs';

// MariaDB documentation, "Initial Handshake Packet": int<3> length, int<1> sequence 0, int<1>
// protocol version 10. "ERR_Packet": header 0xff, e.g. for too many connections.
const greeting = Buffer.from([0x5d, 0, 0, 0, 10, ...Buffer.from('10.11.19-MariaDB\0')]);
const refusal = Buffer.from([0x17, 0, 0, 0, 0xff, 0x10, 0x04]);

let server: net.Server | undefined;
afterEach(() => server?.close());

const listen = (first: Buffer) =>
  new Promise<number>((resolve) => {
    server = net.createServer((socket) => socket.end(first));
    server.listen(0, '127.0.0.1', () =>
      resolve(((server as net.Server).address() as net.AddressInfo).port),
    );
  });

test('a handshake is a greeting; a refusal, a stump or a web server is none', () => {
  expect(isGreeting(greeting)).toBe(true);
  expect(isGreeting(refusal)).toBe(false);
  expect(isGreeting(greeting.subarray(0, 3))).toBe(false);
  expect(isGreeting(Buffer.from('HTTP/1.1 400 Bad Request'))).toBe(false);
});

test('asks a port over the wire', async () => {
  const port = await listen(greeting);
  expect(await speaksMariadb(port)).toBe(true);
});

test('a closed port is a plain no', async () => {
  const port = await listen(greeting);
  await new Promise((resolve) => server?.close(resolve));
  server = undefined;
  expect(await speaksMariadb(port)).toBe(false);
});
