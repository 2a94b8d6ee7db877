const NUMBER_FIRST =
  /\b(street|road|lane|avenue|drive|way|close|court|place|square|terrace|gardens|crescent|grove|row|yard|mews|end|rise|walk|hill|boulevard|strand)$/i;

/** "12 Tern Street, Pellan Bay 7101" where streets are named in English, else "Landstrasse 12, …". */
export function addressLabel(
  street: string,
  houseNumber: string,
  city: string,
  postcode: string,
): string {
  const numberFirst = NUMBER_FIRST.test(street);
  const line = numberFirst ? `${houseNumber} ${street}` : `${street} ${houseNumber}`;
  const town = (numberFirst ? [city, postcode] : [postcode, city]).filter(Boolean).join(' ');
  return town ? `${line}, ${town}` : line;
}
