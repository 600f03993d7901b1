import { isMonth } from '#shared/domain/calendar';
import { BODY_TYPES, type BodyType } from '#shared/domain/vocabulary';

/** What a quote is asked for, as the URL has it. */
export interface QuoteQuestion {
  readonly make: string;
  readonly model: string;
  readonly firstRegistered: string;
  readonly bodyType: BodyType;
  readonly package: string;
  readonly branch: string;
  /** Absent: the branch's target. */
  readonly marginShare?: number;
}

/** The parts of a question as they stand in the URL, any of them missing. */
export type AskedParts = { readonly [K in keyof QuoteQuestion]?: string | undefined };

/** The question, or nothing while a part of it is missing or makes no sense. */
export function questionOf(parts: AskedParts): QuoteQuestion | undefined {
  const { firstRegistered = '', branch } = parts;
  const make = parts.make?.trim();
  const model = parts.model?.trim();
  const bodyType = BODY_TYPES.find((type) => type === parts.bodyType);
  if (!make || !model || !bodyType || !parts.package || !branch) return undefined;
  if (!isMonth(firstRegistered)) return undefined;
  const marginShare = shareOf(parts.marginShare);
  return {
    ...{ make, model, firstRegistered, bodyType, branch, package: parts.package },
    ...(marginShare === undefined ? {} : { marginShare }),
  };
}

/** Per cent as they are typed, to a share: "35", "35,5", "35 %". Nothing where it is no share below 1. */
export function marginTyped(text: string): number | undefined {
  const match = /^\s*(\d{1,2})(?:[.,](\d{1,4}))?\s*%?\s*$/.exec(text);
  return match ? Number((Number(`${match[1]}.${match[2] ?? '0'}`) / 100).toFixed(6)) : undefined;
}

/** A share as per cent to type. */
export function marginToType(share: number | undefined): string {
  return share === undefined ? '' : String(Number((share * 100).toFixed(4)));
}

function shareOf(text: string | undefined): number | undefined {
  if (text === undefined || !/^(0(\.\d{1,6})?|\.\d{1,6})$/.test(text)) return undefined;
  return Number(text);
}
