import type { Choice } from './field';

/** Currencies of ISO 4217 whose minor unit is a hundredth, as the browser knows them. */
export function currencyChoices(): readonly Choice[] {
  const names = new Intl.DisplayNames('en', { type: 'currency' });
  return Intl.supportedValuesOf('currency')
    .filter((code) => minorDigits(code) === 2)
    .map((code) => ({ value: code, name: `${code}, ${names.of(code) ?? code}` }));
}

/** Time zones of the IANA database, as the browser knows them; one that it does not know but that is in use stays. */
export function timeZoneChoices(used?: string): readonly Choice[] {
  const zones = Intl.supportedValuesOf('timeZone');
  const all = used === undefined || zones.includes(used) ? zones : [used, ...zones];
  return all.map((zone) => ({ value: zone, name: zone.replaceAll('_', ' ') }));
}

/** Rows of the catalogue as choices. */
export function rowChoices(
  rows: readonly { readonly code: string; readonly name: string }[],
): readonly Choice[] {
  return rows.map(({ code, name }) => ({ value: code, name }));
}

/** The time zone of the one who sets up, offered first. */
export function ownTimeZone(): string {
  return new Intl.DateTimeFormat().resolvedOptions().timeZone;
}

function minorDigits(currency: string): number | undefined {
  return new Intl.NumberFormat('en', { style: 'currency', currency }).resolvedOptions()
    .maximumFractionDigits;
}
