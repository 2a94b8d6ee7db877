/**
 * The GSM 7-bit default alphabet of 3GPP TS 23.038, 6.2.1, without the escape code. It holds
 * capital Ç; Unicode's mapping file gives small ç the same code, so ç is left out: counted as
 * UCS-2 it can only cost more than the carrier will charge, never less.
 */
const basic = new Set(
  '@£$¥èéùìò\nØø\rÅåΔ_ΦΓΛΩΠΨΣΘΞÆæßÉ !"#¤%&\'()*+,-./0123456789:;<=>?¡ABCDEFGHIJKLMNOPQRSTUVWXYZÄÖÑÜ§¿abcdefghijklmnopqrstuvwxyzäöñüàÇ',
);

/** The default extension table of TS 23.038, 6.2.1.1: each costs two septets. */
const extended = new Set('\f^{}\\[~]|€');

/** Septets a letter takes in GSM-7: 1, 2, or null when only UCS-2 can carry it. */
export function septetsOf(letter: string): 1 | 2 | null {
  if (basic.has(letter)) return 1;
  return extended.has(letter) ? 2 : null;
}
