import type { Params } from '@angular/router';
import { isDate, isWeek } from '#shared/domain/calendar';
import { BODY_TYPES, CONSUMABLE_KINDS } from '#shared/domain/vocabulary';
import { placeWords } from '../../ui/changes/field-words';
import { formatShortDate, formatWeek } from '../../ui/format';
import { BODY_TYPE_NAMES, CONSUMABLE_NAMES } from '../../ui/words';

/** What an event was done to, in words, and the page that shows it where there is one. */
export interface Subject {
  readonly words: string;
  readonly link?: readonly string[];
  readonly query?: Params;
}

/** What words of a subject need to know. */
export interface SubjectNames {
  readonly branchName: (code: string) => string;
  readonly regionName: (code: string) => string;
  readonly productName: (code: string) => string;
  readonly packageName: (code: string) => string;
  readonly personName: (id: number) => string | undefined;
}

/** Reads a path of the trail: `/branches/HAV/jobs/0417` → job 0417 at Havnsund, leading to its sheet. */
export function subjectOf(path: string, names: SubjectNames): Subject {
  const [thing = '', code = '', part, ...rest] = path.replace(/^\//, '').split('/');
  switch (thing) {
    case 'branches':
      return part ? branchPart(code, part, rest, names) : branch(code, names);
    case 'regions':
      return { words: `region ${names.regionName(code)}`, link: ['/set-up/regions', code] };
    case 'products':
      return {
        words: [names.productName(code), ...dated('cost of a litre', part, rest)].join(', '),
        link: ['/set-up/products', code],
      };
    case 'consumables':
      return {
        words: [consumable(code), ...dated('cost of one', part, rest)].join(', '),
        link: ['/set-up/consumables'],
      };
    case 'packages':
      return {
        words: [`package ${names.packageName(code)}`, ...norm(part, rest)].join(', '),
        link: ['/set-up/packages', code],
      };
    case 'network':
      return {
        words: code === 'fees' ? feeWords(part) : 'the network',
        link: ['/set-up/network'],
      };
    case 'people':
      return {
        words: names.personName(Number(code)) ?? `person ${code}`,
        link: ['/set-up/people', code],
      };
    case 'sign-ins':
      return { words: `sign-in ${code.slice(0, 8)}` };
    case 'exports':
      return { words: `the file ${code}` };
    case 'database':
      return { words: 'the database' };
    default:
      return { words: path };
  }
}

function branch(code: string, names: SubjectNames): Subject {
  return { words: `branch ${names.branchName(code)}`, link: ['/set-up/branches', code] };
}

function branchPart(
  code: string,
  part: string,
  rest: readonly string[],
  names: SubjectNames,
): Subject {
  const at = names.branchName(code);
  const [first = ''] = rest;
  switch (part) {
    case 'jobs': {
      const [, reference = '', photo] = /^(.*?)(?:\/photos\/(.*))?$/s.exec(rest.join('/')) ?? [];
      const job = `job ${reference}, ${at}`;
      return {
        words: photo === undefined ? job : `a photo of ${job}`,
        link: ['/jobs', code, reference],
      };
    }
    case 'come-back':
      return { words: leftOn(rest, at), link: ['/jobs', code, first] };
    case 'claims':
      return { words: `claim ${rest.join('/')}, ${at}` };
    case 'keys':
      return { words: `push key ${first}, ${at}`, link: ['/set-up/branches', code] };
    case 'weeks':
      return isWeek(first)
        ? {
            words: `${formatWeek(first)}, ${at}`,
            link: ['/this-week'],
            query: { branch: code, week: first },
          }
        : { words: `a week, ${at}` };
    case 'rates':
      return {
        words: [at, ...dated('hourly cost', 'costs', rest)].join(', '),
        link: ['/set-up/branches', code],
      };
    case 'under-way':
      return { words: `job ${rest.join('/')} under way, ${at}` };
    case 'bookings':
      return { words: `booking ${rest.join('/')}, ${at}` };
    case 'imports':
      return { words: `an imported file, ${at}` };
    default:
      return { words: `${[part.replaceAll('-', ' '), ...rest].join(' ')}, ${at}` };
  }
}

/** A finding that was left on a car, with its place where its reference tells it. */
function leftOn([job = '', zone, side]: readonly string[], at: string): string {
  const place = placeWords(zone, side);
  return `${place ? `${place}, on ` : ''}job ${job}, ${at}`;
}

function feeWords(from = ''): string {
  return isDate(from) ? `network fee from ${formatShortDate(from)}` : 'network fee';
}

function dated(what: string, part: string | undefined, rest: readonly string[]): string[] {
  if (part !== 'costs') return [];
  const [from = ''] = rest;
  return [isDate(from) ? `${what} from ${formatShortDate(from)}` : what];
}

function norm(part: string | undefined, [type]: readonly string[]): string[] {
  if (part !== 'norms') return [];
  const known = BODY_TYPES.find((one) => one === type);
  return [known ? `norm on ${BODY_TYPE_NAMES[known]}` : 'norm'];
}

function consumable(code: string): string {
  const kind = CONSUMABLE_KINDS.find((one) => one === code);
  return kind ? (kind === 'other' ? 'other consumables' : CONSUMABLE_NAMES[kind]) : code;
}
