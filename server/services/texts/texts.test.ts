import { describe, expect, it } from 'vitest';
import { carrierSettings } from '#server/sms/carrierSettings.ts';
import { nextTryMs } from './nextTryMs.ts';
import { isForward, statusOfCarrier } from './textRank.ts';

describe('the state of a text', () => {
  it('knows every status word the carrier documents', () => {
    const words =
      'queued sending sent failed delivered undelivered receiving received accepted scheduled read partially_delivered canceled';
    expect(
      words
        .split(' ')
        .map((word) => statusOfCarrier(word) ?? '-')
        .join(' '),
    ).toBe('queued queued sent failed delivered undelivered - - queued queued delivered - failed');
  });

  it('moves forward only', () => {
    expect(isForward('attempting', 'queued')).toBe(true);
    expect(isForward('sent', 'queued')).toBe(false);
    expect(isForward('delivered', 'undelivered')).toBe(false);
    // A text given up on may still arrive: the phone knows better.
    expect(isForward('failed', 'delivered')).toBe(true);
    expect(isForward('sent', 'sent')).toBe(false);
  });

  it('waits longer each time, half of it drawn', () => {
    expect([1, 2, 3, 7, 99].map((n) => nextTryMs(n, () => 0))).toEqual([
      2500, 5000, 10_000, 150_000, 150_000,
    ]);
    expect(nextTryMs(1, () => 0.5)).toBe(3750);
  });
});

describe('carrierSettings', () => {
  const sid = `AC${'0a'.repeat(16)}`;
  it('reads both or neither', () => {
    expect(carrierSettings({}, null)).toBeNull();
    expect(
      carrierSettings({ TWILIO_ACCOUNT_SID: sid, TWILIO_AUTH_TOKEN: 't' }, 'https://x.example'),
    ).toEqual({ accountSid: sid, authToken: 't' });
  });

  it('names what is missing', () => {
    expect(() => carrierSettings({ TWILIO_ACCOUNT_SID: sid }, 'https://x')).toThrow(
      /TWILIO_AUTH_TOKEN must be set/,
    );
    expect(() => carrierSettings({ TWILIO_AUTH_TOKEN: 't' }, 'https://x')).toThrow(
      /TWILIO_ACCOUNT_SID must be AC/,
    );
    expect(() =>
      carrierSettings({ TWILIO_ACCOUNT_SID: sid, TWILIO_AUTH_TOKEN: 't' }, null),
    ).toThrow(/PUBLIC_URL must be set/);
  });
});
