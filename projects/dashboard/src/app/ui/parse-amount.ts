/**
 * Reads an amount of money as a person types it into minor units: "870", "870.5", "870,50", "1 120.00". `undefined` for anything
 * that could be read two ways ("1,120") or is no amount.
 */
export function parseAmount(text: string): number | undefined {
  const plain = text.replace(/[\s\u00a0\u202f]/g, '');
  const match = /^(\d{1,8})(?:[.,](\d{1,2}))?$/.exec(plain);
  if (!match) return undefined;
  const [, whole = '', part = ''] = match;
  return Number(whole) * 100 + Number(part.padEnd(2, '0'));
}

/** Minor units as a person would type them: 87050 → "870.50". */
export function amountToType(cents: number): string {
  return `${Math.floor(cents / 100)}.${String(cents % 100).padStart(2, '0')}`;
}
