import type { listActions } from '#shared/contracts/actions';
import type { OutOf } from '#shared/contracts/endpoint';
import type { ActionState } from '#shared/domain/vocabulary';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCount, formatCounted, formatDate } from '../../ui/format';
import { ACTION_STATE_NAMES } from './action-words';

type ActionList = OutOf<typeof listActions>;

/** What has been agreed, and what is late. */
export interface ActionsSentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

/** Says how many actions are under way and how many of them are late; `where` reads after "in". */
export function answerActions(
  list: ActionList,
  state: ActionState | undefined,
  where: string,
  mayAgree: boolean,
): ActionsSentences {
  const { agreed, late, done, dropped } = list.counts;
  const ended = [
    ...(done > 0 ? [`${formatCount(done)} done`] : []),
    ...(dropped > 0 ? [`${formatCount(dropped)} dropped`] : []),
  ].join(', ');
  if (state === 'done' || state === 'dropped') {
    const many = list.counts[state];
    if (many === 0)
      return { sentence: [`No action is ${ACTION_STATE_NAMES[state]} in ${where}.`], second: [] };
    return {
      sentence: [
        { figure: formatCount(many) },
        ` ${many === 1 ? 'action is' : 'actions are'} ${ACTION_STATE_NAMES[state]} in ${where}.`,
      ],
      second: [],
    };
  }
  if (agreed === 0) {
    return {
      sentence: [`No action is under way in ${where}.`],
      second: [ended ? `${ended}.` : firstWords(mayAgree)],
    };
  }
  const [first] = list.items.filter((one) => one.state === 'agreed');
  return {
    sentence: [
      { figure: formatCount(agreed) },
      ` ${agreed === 1 ? 'action is' : 'actions are'} under way in ${where}`,
      lateWords(late, agreed),
    ],
    second: [
      ...(first
        ? [
            first.late ? 'Longest due: ' : 'Next due: ',
            {
              text: shortened(first.what),
              link: `/actions/${encodeURIComponent(first.branch)}/${first.id}`,
            },
            `, ${formatDate(first.until)}. `,
          ]
        : []),
      ...(ended ? [{ quiet: `${ended}.` }] : []),
    ],
  };
}

function lateWords(late: number, agreed: number): string {
  if (late === 0) return agreed === 1 ? ', and not late.' : ', none of them late.';
  if (agreed === 1) return ', and it is late.';
  return late === agreed ? ', all of them late.' : `; ${formatCounted(late, 'is', 'are')} late.`;
}

function firstWords(mayAgree: boolean): string {
  return mayAgree
    ? 'Agree one from a signal, or here: what is done, by whom, until when, and the figure to watch.'
    : 'Your regional lead or head office agrees them with you; you answer here.';
}

/** The first words of a long text, to stand within a sentence. */
export function shortened(text: string, most = 60): string {
  const line = text.replace(/\s+/g, ' ').trim();
  return line.length <= most ? line : `${line.slice(0, most).replace(/\s\S*$/, '')} …`;
}
