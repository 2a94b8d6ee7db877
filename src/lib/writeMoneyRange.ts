/**
 * "€61–84" of hundredths of a currency, whole units, the sign where the currency puts it; one amount
 * where both are the same.
 */
export function writeMoneyRange(lowCents: number, highCents: number, currency: string): string {
  const money = new Intl.NumberFormat('en-GB', {
    style: 'currency',
    currency,
    maximumFractionDigits: 0,
  });
  const [low, high] = [Math.round(lowCents / 100), Math.round(highCents / 100)];
  return low === high ? money.format(low) : money.formatRange(low, high);
}
