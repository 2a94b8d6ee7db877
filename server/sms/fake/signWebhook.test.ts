import { describe, expect, it } from 'vitest';
import { openGateway } from '../gateway.ts';
import { signWebhook } from './signWebhook.ts';

// The hosted service's published examples: its security guide (the first) and its Node SDK's own
// tests (the rest), token '12345'.
const common = { CallSid: 'CA1234567890ABCDE', Digits: '1234', To: '+18005551212' };
const guide = { ...common, Caller: '+12349013030', From: '+12349013030' };
const sdk = { ...common, Caller: '+14158675309', From: '+14158675309' };
const examples: [string, Record<string, string>, string][] = [
  ['https://mycompany.com/myapp.php?foo=1&bar=2', guide, '0/KCTR6DLpKmkAf8muzZqo1nDgQ='],
  ['https://mycompany.com/myapp.php?foo=1&bar=2', sdk, 'RSOYDt4T1cUTdK1PDd93/VVr8B8='],
  ['https://mycompany.com:443/myapp.php?foo=1&bar=2', sdk, 'kvajT1Ptam85bY51eRf/AJRuM3w='],
  ['http://mycompany.com:1234/myapp.php?foo=1&bar=2', sdk, 'Zmvh+3yNM1Phv2jhDCwEM3q5ebU='],
  ['http://mycompany.com:80/myapp.php?foo=1&bar=2', sdk, '0ZXoZLH/DfblKGATFgpif+LLRf4='],
];

describe('webhook signatures', () => {
  const gateway = openGateway({
    accountSid: `AC${'0'.repeat(32)}`,
    authToken: '12345',
    apiOrigin: null,
  });

  it.each(examples)('%s is signed as published', async (url, params, signature) => {
    expect(signWebhook('12345', url, params)).toBe(signature);
    expect(await gateway.validSignature(url, params, signature)).toBe(true);
  });

  it('refuses another address, another word, another token and nothing', async () => {
    const [url, params, signature] = examples[0]!;
    expect(await gateway.validSignature(`${url}&x=1`, params, signature)).toBe(false);
    expect(await gateway.validSignature(url, { ...params, Digits: '1235' }, signature)).toBe(false);
    expect(await gateway.validSignature(url, params, signWebhook('12346', url, params))).toBe(
      false,
    );
    expect(await gateway.validSignature(url, params, '')).toBe(false);
  });
});
