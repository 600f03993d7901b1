import {
  ACTION_NAMES,
  BODY_TYPE_NAMES,
  CHECK_ANSWER_NAMES,
  CLAIM_CAUSE_NAMES,
  CLAIM_DECISION_NAMES,
  COME_BACK_STATUS_NAMES,
  CONDITION_NAMES,
  CONSUMABLE_NAMES,
  PRODUCT_KIND_NAMES,
  ROLE_NAMES,
  SIDE_NAMES,
  SOURCE_NAMES,
  ZONE_NAMES,
} from '../words';
import type { KnownNames } from './known-names';

const BY_NAME: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  zone: ZONE_NAMES,
  side: SIDE_NAMES,
  seenAs: CONDITION_NAMES,
  workedAs: CONDITION_NAMES,
  action: ACTION_NAMES,
  bodyType: BODY_TYPE_NAMES,
  kind: { ...CONSUMABLE_NAMES, ...PRODUCT_KIND_NAMES },
  role: ROLE_NAMES,
  status: COME_BACK_STATUS_NAMES,
  source: SOURCE_NAMES,
  cause: CLAIM_CAUSE_NAMES,
  decision: CLAIM_DECISION_NAMES,
  proposedDecision: CLAIM_DECISION_NAMES,
};

/** The word for a code by the field it stands in, or `undefined` where the field holds no code. */
export function enumWords(
  names: readonly string[],
  value: string,
  known: KnownNames,
): string | undefined {
  const name = names.at(-1) ?? '';
  switch (name) {
    case 'package':
      return known.packageName(value);
    case 'product':
      return known.productName(value);
    case 'branch':
    case 'branches':
      return known.branchName(value);
    case 'region':
    case 'regions':
      return known.regionName(value);
  }
  return names[0] === 'checks' ? own(CHECK_ANSWER_NAMES, value) : own(BY_NAME[name], value);
}

/** Only words of the list itself: a text such as "constructor" is no code. */
function own(
  words: Readonly<Record<string, string>> | undefined,
  code: string,
): string | undefined {
  return words && Object.hasOwn(words, code) ? words[code] : undefined;
}
