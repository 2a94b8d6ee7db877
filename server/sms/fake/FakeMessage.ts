import { countSegments } from '#shared/texts/countSegments.ts';

export type FakeStatus = 'queued' | 'sent' | 'delivered' | 'undelivered' | 'received';

/** A message as the fake carrier keeps it. Instants are ISO text. */
export interface FakeMessage {
  sid: string;
  direction: 'outbound-api' | 'outbound-reply' | 'inbound';
  from: string;
  to: string;
  body: string;
  status: FakeStatus;
  errorCode: number | null;
  statusCallback: string | null;
  createdAt: string;
  sentAt: string | null;
  updatedAt: string;
}

/** The message resource as the hosted service documents it: snake case, RFC 2822 dates, numbers as text. */
export function messageJson(message: FakeMessage, accountSid: string) {
  const uri = `/2010-04-01/Accounts/${accountSid}/Messages/${message.sid}`;
  return {
    account_sid: accountSid,
    api_version: '2010-04-01',
    body: message.body,
    date_created: rfc2822(message.createdAt),
    date_sent: message.sentAt === null ? null : rfc2822(message.sentAt),
    date_updated: rfc2822(message.updatedAt),
    direction: message.direction,
    error_code: message.errorCode,
    error_message: null,
    from: message.from,
    messaging_service_sid: null,
    num_media: '0',
    num_segments: String(countSegments(message.body).segments),
    price: null,
    price_unit: 'USD',
    sid: message.sid,
    status: message.status,
    subresource_uris: { media: `${uri}/Media.json` },
    to: message.to,
    uri: `${uri}.json`,
  };
}

function rfc2822(iso: string): string {
  return new Date(iso).toUTCString().replace('GMT', '+0000');
}
