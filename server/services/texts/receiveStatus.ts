import { currentGateway } from '#server/sms/gateway.ts';
import { readCallback } from './callbackUrl.ts';
import { moveText } from './moveText.ts';
import { statusOfCarrier } from './textRank.ts';

/** A call the carrier made to us: `url` whole, as the carrier called it. */
export interface CarrierCall {
  url: string;
  query: Record<string, unknown>;
  form: Record<string, string>;
  signature: string;
}

/**
 * Takes a status callback. Answers false, touching nothing, unless the carrier signed the call and
 * we signed the outbox id in it.
 */
export async function receiveStatus(call: CarrierCall, now: Date): Promise<boolean> {
  if (!(await isFromCarrier(call))) return false;
  const id = readCallback(call.query);
  if (id === null) return false;
  const { MessageSid = '', MessageStatus = '', ErrorCode } = call.form;
  const status = statusOfCarrier(MessageStatus);
  const code = ErrorCode === undefined ? null : Number(ErrorCode);
  if (status !== null) await moveText(id, { status, sid: MessageSid || null, code }, now);
  return true;
}

export async function isFromCarrier({ url, form, signature }: CarrierCall): Promise<boolean> {
  return (await currentGateway()?.validSignature(url, form, signature)) ?? false;
}
