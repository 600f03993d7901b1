/** How a field is typed and read; money in whole units of the currency, shares in per cent, both as people write them. */
export type FieldKind =
  | 'text'
  | 'code'
  | 'packageCode'
  | 'money'
  | 'percent'
  | 'decimal'
  | 'whole'
  | 'date'
  | 'email'
  | 'newPassword'
  | 'choice'
  | 'several';

/** What is typed, by the name of its field; of several choices the codes, a space between. */
export type Typed = Readonly<Record<string, string>>;

/** One field of a form of set-up. */
export interface Field {
  /** Name in the body that is sent, so that a refusal finds its field. */
  readonly key: string;
  readonly label: string;
  readonly kind: FieldKind;
  /** What it is for, or how it is written. */
  readonly hint?: string;
  /** `optional`: may stay empty. Needed otherwise. */
  readonly need?: 'optional';
  /** What can be chosen. */
  readonly choices?: readonly Choice[];
  /** Codes that are somebody else's already. */
  readonly taken?: readonly string[];
  /** Shown only where this holds of what is typed. */
  readonly shownIf?: (typed: Typed) => boolean;
  /** A value that the network itself offers, and what it rests on. */
  readonly offer?: Offer;
  /** How a browser may fill it in. */
  readonly autocomplete?: string;
}

/** What is offered beside a field: why, and what is typed when it is taken; nothing to take where too little is known. */
export interface Offer {
  readonly words: string;
  readonly value?: string;
}

/** A choice: what is sent and what is read. */
export interface Choice {
  readonly value: string;
  readonly name: string;
}

/** What stands in a field; empty where there is no such field. */
export function textOf(typed: Typed, key: string): string {
  return (typed[key] ?? '').trim();
}
