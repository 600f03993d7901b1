import type { UsualCar } from '#shared/contracts/usual';
import { STAGES } from '#shared/domain/vocabulary';
import { formatCars, formatCount, formatMinutes, formatShare, formatVolume } from '../../ui/format';
import { CONSUMABLE_NAMES, STAGE_NAMES } from '../../ui/words';
import type { DraftDocument } from './draft-document';
import { LONG_RUN, minutesRun, minutesWritten, running } from './timers';

/** Something to look at twice; it never keeps a job from being sent. */
export interface SendWarning {
  /** Path of the field it is about. */
  readonly path: string;
  readonly words: string;
}

/** What values are held against. All of it may be missing where there is no line. */
export interface Usual {
  readonly car: UsualCar | undefined;
  readonly norms: readonly { readonly product: string; readonly ml: number }[];
  readonly productName: (code: string) => string;
  readonly now: number;
}

/** Shares of the norm outside of which product counts as little or much. */
const LITTLE = 0.7;
const MUCH = 1.3;

/** Values that lie outside what 95 of 100 such cars took, or far from the norm, in words. */
export function usualWarnings(document: DraftDocument, usual: Usual): readonly SendWarning[] {
  return [
    ...stageWarnings(document, usual),
    ...timerWarnings(document, usual.now),
    ...productWarnings(document, usual),
    ...consumableWarnings(document, usual),
  ];
}

interface Range {
  readonly low: number | null;
  readonly high: number | null;
}

function stageWarnings(document: DraftDocument, { car, now }: Usual): readonly SendWarning[] {
  if (!car) return [];
  return STAGES.flatMap((stage) => {
    const range = car.stages.find((one) => one.stage === stage);
    const written = minutesWritten(document, stage);
    if (written === undefined || !range) return [];
    const minutes = written + minutesRun(document, stage, now);
    // The range is of cars that had work in the stage; one without any is not unusual by it.
    if (minutes === 0 || !isOutside(minutes, range)) return [];
    const words = `${capital(STAGE_NAMES[stage])} ${formatMinutes(minutes)}; 95 of 100 such cars took ${between(range, formatMinutes)} ${behind(car)}.`;
    return [{ path: `/actual/stages/${stage}`, words }];
  });
}

/** A timer left on over night counts the night. */
function timerWarnings(document: DraftDocument, now: number): readonly SendWarning[] {
  return running(document).flatMap((stage) => {
    const minutes = minutesRun(document, stage, now);
    if (minutes < LONG_RUN) return [];
    const words = `The timer of ${STAGE_NAMES[stage]} has run for ${formatMinutes(minutes)}. If it was left on, stop it and take off what was not worked.`;
    return [{ path: `/actual/stages/${stage}`, words }];
  });
}

function productWarnings(
  document: DraftDocument,
  { car, norms, productName }: Usual,
): readonly SendWarning[] {
  return (document.products ?? []).flatMap(({ product, ml }) => {
    if (ml === undefined) return [];
    const path = `/products/${product}/ml`;
    const norm = norms.find((one) => one.product === product)?.ml;
    if (norm !== undefined && norm > 0 && (ml < LITTLE * norm || ml > MUCH * norm)) {
      const words = `${productName(product)} ${formatVolume(ml)} is ${formatShare(ml / norm)} of the norm of ${formatVolume(norm)}.`;
      return [{ path, words }];
    }
    const range = car?.products.find((one) => one.product === product);
    if (!car || !range || !isOutside(ml, range)) return [];
    const words = `${productName(product)} ${formatVolume(ml)}; 95 of 100 such cars took ${between(range, formatVolume)} ${behind(car)}.`;
    return [{ path, words }];
  });
}

function consumableWarnings(document: DraftDocument, { car }: Usual): readonly SendWarning[] {
  return (document.consumables ?? []).flatMap(({ kind, quantity }) => {
    const range = car?.consumables.find((one) => one.kind === kind);
    if (!car || !range || !isOutside(quantity, range)) return [];
    const words = `${formatCount(quantity)} ${CONSUMABLE_NAMES[kind]}; 95 of 100 such cars took ${between(range, formatCount)} ${behind(car)}.`;
    return [{ path: `/consumables/${kind}/quantity`, words }];
  });
}

function isOutside(value: number, { low, high }: Range): boolean {
  return low !== null && high !== null && (value < low || value > high);
}

function between({ low, high }: Range, format: (value: number) => string): string {
  return `${format(Math.round(low ?? 0))} to ${format(Math.round(high ?? 0))}`;
}

function behind({ basis }: UsualCar): string {
  const whose = basis.source === 'network' ? 'the network' : 'this branch';
  return `(${formatCars(basis.cars)}, ${whose})`;
}

function capital(word: string): string {
  return word.charAt(0).toUpperCase() + word.slice(1);
}
