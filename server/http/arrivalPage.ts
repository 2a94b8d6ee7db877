import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Arrival } from '#shared/api/arrival.ts';
import { env } from '#server/env.ts';

/** Fills the built arrival page: title, the essential lines, and the data its script starts from. */
export async function arrivalPage(arrival: Arrival | null, apology = ''): Promise<string> {
  const html = await readFile(join(env.rootFolder, 'dist/src/arrival.html'), 'utf8').catch(
    () => bare,
  );
  const title = arrival ? `${arrival.headline} · ${arrival.businessName}` : 'Arrival';
  const lines = arrival
    ? [
        `<p>${escapeHtml(arrival.businessName)}</p>`,
        `<h1>${escapeHtml(arrival.headline)}</h1>`,
        `<p>${escapeHtml(arrival.sentence)}</p>`,
        ...(arrival.promiseWords ? [`<p>${escapeHtml(arrival.promiseWords)}</p>`] : []),
      ]
    : [`<h1>This link shows nothing</h1>`, `<p>${escapeHtml(apology)}</p>`];
  return html
    .replace('<!--furlong:head-->', () => `<title>${escapeHtml(title)}</title>`)
    .replace('<!--furlong:sentence-->', () => lines.join(''))
    .replace('<!--furlong:data-->', () => jsonForHtml(arrival));
}

/** "<" is escaped so that no value can close the script element it stands in. */
function jsonForHtml(value: unknown): string {
  return JSON.stringify(value)
    .replace(/</g, '\\u003c')
    .replace(/\u2028|\u2029/g, '');
}

function escapeHtml(text: string): string {
  return text
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/"/g, '&quot;');
}

/** Before the client is built, the words alone. */
const bare =
  '<!doctype html><html lang="en"><head><meta charset="utf-8"><!--furlong:head--></head><body><!--furlong:sentence--></body></html>';
