import type { JobSheet } from '#shared/contracts/jobs';
import { addMonths, ageInYears } from '#shared/domain/calendar';
import { CHECKS } from '#shared/domain/vocabulary';
import type { Fact } from '../../ui/fact-list/fact-list';
import {
  formatCount,
  formatCounted,
  formatDate,
  formatExactMoney,
  formatMonth,
  formatNumber,
  formatShare,
} from '../../ui/format';
import { BODY_TYPE_NAMES, CHECK_ANSWER_NAMES, CHECK_NAMES } from '../../ui/words';

/** The car as the branch described it. */
export function carFacts(job: JobSheet): readonly Fact[] {
  const { vehicle } = job;
  const age = ageInYears(vehicle.firstRegistered, job.completedOn);
  return present([
    ['Car', `${vehicle.make} ${vehicle.model}`],
    ['Body type', BODY_TYPE_NAMES[vehicle.bodyType]],
    [
      'First registered',
      `${formatMonth(vehicle.firstRegistered)}, ${age === 0 ? 'under a year' : formatCounted(age, 'year', 'years')} old`,
    ],
    [
      'Odometer',
      vehicle.odometerKm === undefined ? undefined : `${formatCount(vehicle.odometerKm)} km`,
    ],
    ["Branch's key of the car", vehicle.key],
  ]);
}

/** When it came, went, and how long it is covered. */
export function dateFacts(job: JobSheet, packageName: string): readonly Fact[] {
  const months = job.warrantyMonths;
  return present([
    ['Package', packageName],
    ['Booked', job.bookedOn && formatDate(job.bookedOn)],
    ['Begun', job.startedOn && formatDate(job.startedOn)],
    ['Finished', formatDate(job.completedOn)],
    [
      'Warranty',
      months > 0
        ? `${formatCounted(months, 'month', 'months')}, to ${formatDate(addMonths(job.completedOn, months))}`
        : 'none',
    ],
  ]);
}

/** What was quoted and billed; a recorder's answer carries only the quoted price. */
export function billFacts(job: JobSheet, currency: string): readonly Fact[] {
  const total = job.invoice?.totalCents;
  return present([
    [
      'Quoted',
      job.estimate ? formatExactMoney(job.estimate.priceCents, currency) : 'no estimate recorded',
    ],
    ['Invoice', job.invoice ? (job.invoice.number ?? 'written, no number') : 'not written yet'],
    ['Invoiced on', job.invoice?.issuedOn && formatDate(job.invoice.issuedOn)],
    [
      'Invoice total before tax',
      total === undefined ? undefined : formatExactMoney(total, currency),
    ],
  ]);
}

/** The process checks; one answered "no" is marked. */
export function checkFacts(job: JobSheet): readonly Fact[] {
  return CHECKS.map((check) => {
    const answer = job.checks?.[check];
    return {
      name: CHECK_NAMES[check],
      text: answer ? CHECK_ANSWER_NAMES[answer] : 'not recorded',
      marked: answer === 'no',
    };
  });
}

/** The workshop while product went on: wax flows when warm. */
export function workshopFacts(job: JobSheet): readonly Fact[] {
  const { temperatureC, humidityPct } = job.workshop ?? {};
  return present([
    [
      'Temperature',
      temperatureC === undefined
        ? undefined
        : `${formatNumber(temperatureC, Number.isInteger(temperatureC) ? 0 : 1)} °C`,
    ],
    ['Humidity', humidityPct === undefined ? undefined : formatShare(humidityPct / 100)],
  ]);
}

function present(pairs: readonly (readonly [string, string | undefined])[]): readonly Fact[] {
  return pairs.flatMap(([name, text]) => (text ? [{ name, text }] : []));
}
