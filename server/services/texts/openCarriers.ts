import { env, fakesActive } from '#server/env.ts';
import { closeMail, openMail } from '#server/mail/openMail.ts';
import { carrierSettings } from '#server/sms/carrierSettings.ts';
import { startFakeCarrier, type FakeCarrier } from '#server/sms/fake/startFakeCarrier.ts';
import { closeGateway, openGateway } from '#server/sms/gateway.ts';
import { readTextRules, setTextRules } from './textRules.ts';

let fake: FakeCarrier | null = null;

/**
 * Opens the doors for letters and texts, once, when the server starts listening. Real ones by
 * SMTP_URL and MAIL_FROM, TWILIO_ACCOUNT_SID and TWILIO_AUTH_TOKEN; else the fakes, while those are
 * active; else none, and texts are noted as not sent. `origin` is where carriers call back.
 */
export async function openCarriers(asked: {
  origin: string;
  now: () => Date;
  source?: Record<string, string | undefined>;
  /** Where the fakes keep what they carried; null for memory only. */
  folder?: string | null;
  /** Milliseconds between two statuses at the fake carrier. */
  fakeStepMs?: number;
}): Promise<{ close(): Promise<void> }> {
  const { origin, now, source = process.env, folder = env.dataFolder, fakeStepMs } = asked;
  const from = source.MAIL_FROM ?? 'Furlong <furlong@localhost>';
  if (source.SMTP_URL) openMail({ smtpUrl: source.SMTP_URL, from, folder: null });
  else if (fakesActive()) openMail({ smtpUrl: null, from, folder });

  const real = carrierSettings(source, env.publicUrl);
  setTextRules(real && readTextRules(source));
  if (real) openGateway({ ...real, apiOrigin: null });
  else if (fakesActive()) {
    fake = await startFakeCarrier({
      folder,
      now,
      inboundUrl: `${origin}/hooks/sms/inbound`,
      ...(fakeStepMs === undefined ? {} : { stepMs: fakeStepMs }),
    });
    const { accountSid, authToken, url: apiOrigin } = fake;
    openGateway({ accountSid, authToken, apiOrigin });
  }
  return {
    async close() {
      closeMail();
      closeGateway();
      setTextRules(null);
      await fake?.close();
      fake = null;
    },
  };
}

/** The fake carrier while it stands in for the real one, else null. */
export function currentFake(): FakeCarrier | null {
  return fakesActive() ? fake : null;
}
