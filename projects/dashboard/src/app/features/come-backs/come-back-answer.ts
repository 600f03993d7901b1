import type { ComeBack, listComeBack } from '#shared/contracts/come-back';
import { isDangerous } from '#shared/domain/danger';
import type { OutOf } from '#shared/contracts/endpoint';
import type { AnswerPart } from '../../ui/answer/answer';
import { placeOf, waitWords } from '../../ui/come-back/come-back-words';
import { formatCars, formatCount, formatCounted, formatDate } from '../../ui/format';
import { COME_BACK_STATUS_NAMES } from '../../ui/words';
import type { StatusChoice } from './status-filter';

type ComeBackList = OutOf<typeof listComeBack>;

/** What is left on cars, and what to do next. */
export interface ComeBackSentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

/** Says how many dangerous findings are on cars and where to begin. */
export function answerComeBacks(
  list: ComeBackList,
  status: StatusChoice,
  today: string,
): ComeBackSentences {
  if (list.findings === 0) return nothing(status);
  const second = status === 'done' || status === 'gone' ? [] : nextStep(list.items, today);
  return { sentence: status ? narrowed(list, status) : standing(list), second };
}

function standing(list: ComeBackList): AnswerPart[] {
  const { dangerous, dangerousNotTold } = list;
  if (dangerous === 0) {
    return [
      { figure: formatCount(list.findings) },
      list.findings === 1 ? ' finding is still on a car' : ' findings are still on cars',
      { quiet: ` (${formatCars(list.cars)})` },
      ', none of them dangerous.',
    ];
  }
  return [
    { figure: formatCount(dangerous) },
    dangerous === 1
      ? ' dangerous finding is still on a car'
      : ' dangerous findings are still on cars',
    { quiet: ` (${behind(list)})` },
    ...toldWords(dangerous, dangerousNotTold),
  ];
}

function toldWords(dangerous: number, notTold: number): AnswerPart[] {
  if (notTold === 0) {
    return [
      dangerous === 1
        ? '; its owner has been told in writing.'
        : '; all owners have been told in writing.',
    ];
  }
  if (dangerous === 1) return ['; its owner has not been told in writing.'];
  return [
    notTold === dangerous
      ? '; of none has the owner been told in writing.'
      : `; of ${formatCount(notTold)} the owner has not been told in writing.`,
  ];
}

function narrowed(list: ComeBackList, status: NonNullable<StatusChoice>): AnswerPart[] {
  const danger =
    list.dangerous === 0 ? 'none dangerous' : `${formatCount(list.dangerous)} dangerous`;
  return [
    { figure: formatCount(list.findings) },
    `${list.findings === 1 ? ' finding stands' : ' findings stand'} as “${COME_BACK_STATUS_NAMES[status]}” `,
    { quiet: `(${formatCars(list.cars)})` },
    `, ${danger}.`,
  ];
}

function behind(list: ComeBackList): string {
  return `${formatCounted(list.findings, 'finding', 'findings')}, ${formatCars(list.cars)}`;
}

function nothing(status: StatusChoice): ComeBackSentences {
  return {
    sentence: [
      status
        ? `No finding stands as “${COME_BACK_STATUS_NAMES[status]}” here.`
        : 'No finding is left on a car here.',
    ],
    second: ['To look further, choose other branches or dates in the line above.'],
  };
}

/** Owners who do not know come first, then dates that have passed, then danger without a date, then the longest wait. */
function nextStep(items: readonly ComeBack[], today: string): AnswerPart[] {
  const untold = items.find((item) => isDangerous(item) && !item.ownerToldOn);
  if (untold) {
    return [
      'Begin here: tell the owner of the ',
      carLink(untold),
      ` in writing; ${restOf(untold, today)}.`,
    ];
  }
  const passed = items.filter((item) => item.dueOn !== null && item.dueOn < today);
  const [first] = [...passed].sort((a, b) => (a.dueOn! < b.dueOn! ? -1 : 1));
  if (first) {
    const others =
      passed.length > 1
        ? `, and ${formatCounted(passed.length - 1, 'other is', 'others are')} past theirs`
        : '';
    return [
      'Begin here: the ',
      carLink(first),
      ` was due on ${formatDate(first.dueOn!)}${others}.`,
    ];
  }
  const undated = items.find((item) => isDangerous(item) && item.dueOn === null);
  const next = undated ?? items[0];
  if (!next) return [];
  return undated
    ? ['Next: set a day for the ', carLink(next), `; ${restOf(next, today)}.`]
    : ['At the head of the list: the ', carLink(next), `; ${restOf(next, today)}.`];
}

function carLink({ vehicle, branch, jobRef }: ComeBack): Exclude<AnswerPart, string> {
  return {
    text: `${vehicle.make} ${vehicle.model} ${vehicle.firstRegistered.slice(0, 4)}`,
    link: `/jobs/${encodeURIComponent(branch)}/${encodeURIComponent(jobRef)}`,
  };
}

function restOf(item: ComeBack, today: string): string {
  return `${placeOf(item)}, for ${waitWords(item.completedOn, today)}`;
}
