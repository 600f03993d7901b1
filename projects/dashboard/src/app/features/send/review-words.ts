import { CHECKS, STAGES } from '#shared/domain/vocabulary';
import {
  formatCount,
  formatCounted,
  formatDate,
  formatExactMoney,
  formatMinutes,
  formatMonth,
  formatVolume,
} from '../../ui/format';
import {
  ACTION_NAMES,
  BODY_TYPE_NAMES,
  CHECK_ANSWER_NAMES,
  CHECK_NAMES,
  CONDITION_NAMES,
  CONSUMABLE_NAMES,
  STAGE_NAMES,
} from '../../ui/words';
import type { DraftDocument } from './draft-document';
import { findingName } from './field-words';
import { minutesRun, minutesWritten, running } from './timers';
import type { SendStep } from './send-steps';

/** One step of a job in words, to be read over before it is sent. */
export interface ReviewPart {
  readonly step: SendStep;
  readonly lines: readonly string[];
}

/** What the words need to know beyond the draft. */
export interface ReviewNames {
  readonly packageName: (code: string) => string;
  readonly productName: (code: string) => string;
  readonly currency: string;
  readonly money: 'shown' | 'hidden';
  readonly now: number;
  readonly photos: number;
}

/** The whole job in words, step by step. */
export function reviewWords(document: DraftDocument, names: ReviewNames): readonly ReviewPart[] {
  return [
    { step: 'car', lines: carLines(document) },
    { step: 'package', lines: packageLines(document, names) },
    { step: 'stages', lines: stageLines(document, names) },
    { step: 'findings', lines: findingLines(document, names) },
    { step: 'product', lines: productLines(document, names) },
    { step: 'invoice', lines: billLines(document, names) },
  ];
}

/** "Velder Tessock 2009", or what there is of it. */
export function carWords({ vehicle }: DraftDocument): string {
  const parts = [vehicle?.make, vehicle?.model, vehicle?.firstRegistered?.slice(0, 4)];
  return parts
    .map((part) => part?.trim())
    .filter(Boolean)
    .join(' ');
}

function carLines(document: DraftDocument): readonly string[] {
  const { jobRef, vehicle } = document;
  return [
    ...(jobRef ? [`Job ${jobRef}`] : []),
    [
      [vehicle?.make, vehicle?.model].filter(Boolean).join(' '),
      vehicle?.bodyType ? BODY_TYPE_NAMES[vehicle.bodyType] : '',
      vehicle?.firstRegistered ? `first registered ${formatMonth(vehicle.firstRegistered)}` : '',
    ],
    [
      vehicle?.odometerKm === undefined ? '' : `${formatCount(vehicle.odometerKm)} km`,
      vehicle?.key ? `key ${vehicle.key}` : '',
    ],
  ].flatMap(lineOf);
}

function packageLines(document: DraftDocument, names: ReviewNames): readonly string[] {
  const { estimate } = document;
  const minutes = sum(STAGES.map((stage) => estimate?.stages?.[stage]));
  return [
    [document.package ? names.packageName(document.package) : ''],
    [
      document.bookedOn ? `booked ${formatDate(document.bookedOn)}` : '',
      document.startedOn ? `started ${formatDate(document.startedOn)}` : '',
      document.completedOn ? `finished ${formatDate(document.completedOn)}` : '',
    ],
    [
      estimate?.priceCents === undefined
        ? ''
        : `quoted ${formatExactMoney(estimate.priceCents, names.currency)}`,
      minutes > 0 ? `estimated ${formatMinutes(minutes)}` : '',
    ],
  ].flatMap(lineOf);
}

function stageLines(document: DraftDocument, names: ReviewNames): readonly string[] {
  const worked = STAGES.filter(
    (stage) => (minutesWritten(document, stage) ?? 0) > 0 || document.timers?.[stage],
  ).map((stage) => ({
    stage,
    minutes: (minutesWritten(document, stage) ?? 0) + minutesRun(document, stage, names.now),
  }));
  const run = running(document).map((stage) => STAGE_NAMES[stage]);
  return [
    ...(worked.length > 0
      ? [
          worked
            .map(({ stage, minutes }) => `${STAGE_NAMES[stage]} ${formatMinutes(minutes)}`)
            .join(', '),
          `together ${formatMinutes(sum(worked.map(({ minutes }) => minutes)))}`,
        ]
      : []),
    ...(run.length > 0 ? [`timer running: ${run.join(', ')}; it stops when the job is sent`] : []),
    ...(document.agreedExtras ?? []).map((extra) =>
      [
        `agreed beyond the quote on ${formatDate(extra.on)}: ${formatMinutes(sum([extra.minutes]))}`,
        ...(extra.priceCents !== undefined && names.money === 'shown'
          ? [formatExactMoney(extra.priceCents, names.currency)]
          : []),
        ...(extra.note ? [extra.note] : []),
      ].join(', '),
    ),
  ];
}

function findingLines(document: DraftDocument, names: ReviewNames): readonly string[] {
  const findings = document.findings ?? [];
  const photos = names.photos > 0 ? [formatCounted(names.photos, 'photo', 'photos')] : [];
  if (findings.length === 0) return ['no rust found', ...photos];
  const lines = findings.map((one) =>
    [
      findingName(document, one.ref),
      one.seenAs ? `seen as ${CONDITION_NAMES[one.seenAs]}` : '',
      one.workedAs ? `worked as ${CONDITION_NAMES[one.workedAs]}` : '',
      one.action ? ACTION_NAMES[one.action] : '',
      one.structural ? 'load-bearing' : '',
      one.repairMinutes ? `repair ${formatMinutes(one.repairMinutes)}` : '',
      one.chargedCents && names.money === 'shown'
        ? `charged ${formatExactMoney(one.chargedCents, names.currency)}`
        : '',
    ]
      .filter(Boolean)
      .join(', '),
  );
  return [...lines, ...photos];
}

function productLines(document: DraftDocument, names: ReviewNames): readonly string[] {
  const { temperatureC, humidityPct } = document.workshop ?? {};
  const answers = CHECKS.flatMap((check) => {
    const answer = document.checks?.[check];
    return answer ? [`${CHECK_NAMES[check]}: ${CHECK_ANSWER_NAMES[answer]}`] : [];
  });
  return [
    (document.products ?? []).map(
      ({ product, ml }) => `${names.productName(product)} ${formatVolume(ml ?? 0)}`,
    ),
    (document.consumables ?? []).map(
      ({ kind, quantity }) => `${CONSUMABLE_NAMES[kind]} ${formatCount(quantity)}`,
    ),
    answers,
    [
      temperatureC === undefined ? '' : `workshop ${temperatureC} °C`,
      humidityPct === undefined ? '' : `humidity ${humidityPct} %`,
    ],
  ].flatMap(lineOf);
}

function billLines(document: DraftDocument, names: ReviewNames): readonly string[] {
  const { invoice, boughtInCents, notes } = document;
  const shown = names.money === 'shown';
  return [
    ...(shown && invoice
      ? lineOf([
          invoice.totalCents === undefined
            ? 'bill'
            : `bill ${formatExactMoney(invoice.totalCents, names.currency)} before tax`,
          invoice.number ? `number ${invoice.number}` : '',
          invoice.issuedOn ? `of ${formatDate(invoice.issuedOn)}` : '',
        ])
      : [shown ? 'billed later' : 'the bill is written in the office']),
    ...(shown && boughtInCents
      ? [`bought in ${formatExactMoney(boughtInCents, names.currency)}`]
      : []),
    ...(notes ? [notes] : []),
  ];
}

function lineOf(parts: string | readonly string[]): readonly string[] {
  const line = typeof parts === 'string' ? parts : parts.filter(Boolean).join(', ');
  return line === '' ? [] : [line];
}

function sum(values: readonly (number | undefined)[]): number {
  return values.reduce<number>((total, value) => total + (value ?? 0), 0);
}
