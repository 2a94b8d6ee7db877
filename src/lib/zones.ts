export interface PlaceGuess {
  timeZone: string;
  currency: string;
  distanceUnit: 'km' | 'mi';
  weightUnit: 'kg' | 'lb';
}

/** Where this device seems to be: its zone, and the money and measures of its language's region. */
export function detectPlace(): PlaceGuess {
  const region = regionOf(navigator.language);
  const zone = Intl.DateTimeFormat().resolvedOptions().timeZone || 'UTC';
  return {
    timeZone: zone,
    currency: currencyByRegion[region] ?? (zone.startsWith('Europe/') ? 'EUR' : 'USD'),
    distanceUnit: ['US', 'GB', 'LR', 'MM'].includes(region) ? 'mi' : 'km',
    weightUnit: ['US', 'LR', 'MM'].includes(region) ? 'lb' : 'kg',
  };
}

/** Every zone the browser knows, as choices; `extra` is kept even when the list lacks it. */
export function listTimeZones(extra: string): { value: string; label: string }[] {
  const zones = new Set([extra, 'UTC', ...Intl.supportedValuesOf('timeZone')]);
  return [...zones].sort().map((zone) => ({ value: zone, label: zone.replaceAll('_', ' ') }));
}

/** Every currency the browser knows, "EUR · euro". */
export function listCurrencies(): { value: string; label: string }[] {
  const names = new Intl.DisplayNames(['en'], { type: 'currency' });
  return Intl.supportedValuesOf('currency').map((code) => {
    const words = names.of(code);
    return { value: code, label: words && words !== code ? `${code} · ${words}` : code };
  });
}

function regionOf(language: string): string {
  try {
    return new Intl.Locale(language).maximize().region ?? '';
  } catch {
    return '';
  }
}

/** ISO 4217 by ISO 3166 region, where it is not the euro; only a first guess in a form. */
const currencyByRegion: Record<string, string> = {
  US: 'USD',
  GB: 'GBP',
  CA: 'CAD',
  AU: 'AUD',
  NZ: 'NZD',
  CH: 'CHF',
  SE: 'SEK',
  NO: 'NOK',
  DK: 'DKK',
  PL: 'PLN',
  CZ: 'CZK',
  HU: 'HUF',
  RO: 'RON',
  JP: 'JPY',
  ZA: 'ZAR',
  IN: 'INR',
  BR: 'BRL',
  MX: 'MXN',
};
