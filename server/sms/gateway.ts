import type { Twilio } from 'twilio';
import { carrierErrorOf } from './CarrierError.ts';

export interface GatewaySettings {
  accountSid: string;
  authToken: string;
  /** Origin that answers instead of the carrier's own, for the fake; null for the real carrier. */
  apiOrigin: string | null;
  timeoutMs?: number;
}

export interface SentText {
  sid: string;
  status: string;
  body: string;
  createdAt: Date;
  errorCode: number | null;
}

/** The only door to the carrier: real or fake, through the same SDK and the same code. */
export interface Gateway {
  /** Hands one text to the carrier. Throws `CarrierError`, whose `outcome` says what to do next. */
  sendText(text: {
    from: string;
    to: string;
    body: string;
    statusCallback: string;
  }): Promise<{ sid: string; status: string }>;
  /**
   * Texts the carrier took from `from` to `to` since an instant, newest first; `body` narrows to
   * exactly these words. Throws `CarrierError` when the carrier cannot be asked.
   */
  findTexts(asked: { from: string; to: string; since: Date; body?: string }): Promise<SentText[]>;
  /** True when the carrier signed this call to `url` (whole and public, as the carrier called it). */
  validSignature(url: string, params: Record<string, string>, signature: string): Promise<boolean>;
}

let current: Gateway | null = null;

/** Opens the door at start. The SDK is loaded with the first text, because loading it takes a while. */
export function openGateway(settings: GatewaySettings): Gateway {
  current = makeGateway(settings);
  return current;
}

/** The gateway opened at start; null while no carrier, real or fake, is connected. */
export function currentGateway(): Gateway | null {
  return current;
}

/** Forgets the gateway: from now on no carrier is connected. */
export function closeGateway(): void {
  current = null;
}

function makeGateway(settings: GatewaySettings): Gateway {
  let client: Promise<Twilio> | null = null;
  const connected = () => (client ??= connect(settings));
  return {
    async sendText(text) {
      const api = await connected();
      try {
        const { sid, status } = await api.messages.create(text);
        return { sid, status };
      } catch (error) {
        throw carrierErrorOf(error);
      }
    },
    async findTexts({ from, to, since, body }) {
      const api = await connected();
      try {
        // The carrier's dates are whole seconds.
        const earliestMs = Math.floor(since.getTime() / 1000) * 1000;
        // Not narrowed by date at the carrier: a text it still holds has no sent date to match.
        const found = await api.messages.list({ from, to, limit: 200, pageSize: 200 });
        return found
          .filter((text) => text.dateCreated.getTime() >= earliestMs)
          .filter((text) => body === undefined || text.body === body)
          .map((text) => ({
            sid: text.sid,
            status: text.status,
            body: text.body,
            createdAt: text.dateCreated,
            errorCode: text.errorCode,
          }));
      } catch (error) {
        throw carrierErrorOf(error);
      }
    },
    async validSignature(url, params, signature) {
      const { default: twilio } = await import('twilio');
      return twilio.validateRequest(settings.authToken, signature, url, params);
    },
  };
}

async function connect({ accountSid, authToken, apiOrigin, timeoutMs = 10_000 }: GatewaySettings) {
  const { default: twilio } = await import('twilio');
  const httpClient = new twilio.RequestClient({ timeout: timeoutMs });
  if (apiOrigin !== null) {
    // The SDK knows hosts, not origins: this turns its calls to the fake's port.
    const request = httpClient.request.bind(httpClient);
    httpClient.request = (asked) => {
      const { pathname, search } = new URL(asked.uri);
      return request({ ...asked, uri: `${apiOrigin}${pathname}${search}` });
    };
  }
  return twilio(accountSid, authToken, { httpClient });
}
