import { createServer, request } from 'node:http';
import type { AddressInfo } from 'node:net';
import { expect, test } from 'vitest';
import { addressIn } from '@/lib/server/client-address';
import { PEER_HEADER, notePeers } from '@/lib/server/note-peers';

const from = (peer: string, forwarded: string | null, proxies: readonly string[] = []) =>
  addressIn(new Headers({ [PEER_HEADER]: peer, ...(forwarded === null ? {} : { 'x-forwarded-for': forwarded }) }), proxies);

test('SRV-15 without a front server the socket decides, whatever X-Forwarded-For says', () => {
  expect(from('192.0.2.1', null)).toBe('192.0.2.1');
  for (const told of ['198.51.100.1', '127.0.0.1, 10.0.0.1', '', 'unknown', '"><script>'])
    expect(from('192.0.2.1', told)).toBe('192.0.2.1');
});

test('SRV-15 of what front servers wrote, the last address that is none of them counts: what a client put before it does not', () => {
  const proxies = ['10.0.0.1', '10.0.0.2'];
  expect(from('10.0.0.1', '198.51.100.7', proxies)).toBe('198.51.100.7');
  expect(from('10.0.0.1', '203.0.113.9, 198.51.100.7, 10.0.0.2', proxies)).toBe('198.51.100.7');
  for (let spoofed = 0; spoofed < 50; spoofed += 1) {
    expect(from('10.0.0.1', `203.0.113.${String(spoofed)}, 198.51.100.7`, proxies)).toBe('198.51.100.7');
  }
  expect(from('10.0.0.1', null, proxies)).toBe('10.0.0.1');
  expect(from('10.0.0.1', 'garbage', proxies)).toBe('10.0.0.1');
});

test('SRV-15 one household of IPv6 is one address; IPv4 is itself in every spelling', () => {
  expect(from('2001:db8:1:2:aaaa::1', null)).toBe(from('2001:0DB8:0001:2::ffff', null));
  expect(from('2001:db8:1:2::1', null)).toBe('2001:db8:1:2::/64');
  expect(from('2001:db8:1:3::1', null)).not.toBe(from('2001:db8:1:2::1', null));
  expect(from('::1', null)).toBe('0:0:0:0::/64');
  expect(from('::ffff:192.0.2.1', null)).toBe('192.0.2.1');
  expect(from('fe80::1%eth0', null)).toBe('fe80:0:0:0::/64');
  expect(from('', null)).toBe('unknown');
});

test('SRV-15 a server writes down the address of the socket, over whatever a client sent under that name', async () => {
  notePeers();
  const server = createServer((asked, answer) => {
    answer.end(JSON.stringify(asked.headers[PEER_HEADER]));
  });
  await new Promise<void>((resolve) => {
    server.listen(0, '127.0.0.1', () => {
      resolve();
    });
  });
  const { port } = server.address() as AddressInfo;
  const heard = await new Promise<string>((resolve, reject) => {
    request({ port, host: '127.0.0.1', headers: { [PEER_HEADER]: '198.51.100.1', 'X-Footring-Peer': '198.51.100.2' } }, (answer) => {
      answer.on('data', (chunk: Buffer) => {
        resolve(chunk.toString());
      });
    })
      .on('error', reject)
      .end();
  });
  server.close();
  expect(JSON.parse(heard)).toBe('127.0.0.1');
});
