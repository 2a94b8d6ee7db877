import { type Request, type Response, Router, urlencoded } from 'express';
import { clock } from '#server/clock.ts';
import { ownOrigin } from '#server/http/csrf.ts';
import { log } from '#server/log.ts';
import { receiveStatus, type CarrierCall } from '#server/services/texts/receiveStatus.ts';
import { receiveText } from '#server/services/texts/receiveText.ts';

/**
 * What the SMS carrier calls: signed forms, no session, no contract of ours. Whoever mounts this
 * must not put session or CSRF checks before it; the signature is the check.
 */
export const webhookRoutes = Router();

webhookRoutes.use('/hooks', urlencoded({ extended: false, limit: '64kb' }));
webhookRoutes.post('/hooks/sms/status', (req, res) => answer(req, res, receiveStatus));
webhookRoutes.post('/hooks/sms/inbound', (req, res) => answer(req, res, receiveText));

async function answer(
  req: Request,
  res: Response,
  receive: (call: CarrierCall, now: Date) => Promise<boolean>,
): Promise<void> {
  const taken = await receive(
    {
      url: `${ownOrigin(req)}${req.originalUrl}`,
      query: req.query,
      form: readForm(req.body),
      signature: req.get('X-Twilio-Signature') ?? '',
    },
    clock.now(),
  );
  if (!taken) log.warn({ path: req.path, ip: req.ip }, 'refused a call the carrier did not sign');
  // An empty answer document: nothing is to be texted back.
  res
    .status(taken ? 200 : 403)
    .type('text/xml')
    .send('<Response/>');
}

/** A form may repeat a name; the carrier's never do, and its signature then would not fit anyway. */
function readForm(body: unknown): Record<string, string> {
  const form: Record<string, string> = {};
  for (const [name, value] of Object.entries((body ?? {}) as Record<string, unknown>))
    if (typeof value === 'string') form[name] = value;
  return form;
}
