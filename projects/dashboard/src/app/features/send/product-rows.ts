import type { UsualCar } from '#shared/contracts/usual';
import { formatVolume } from '../../ui/format';
import type { DraftDocument } from './draft-document';

/** A product to write down, with what it is held against. */
export interface ProductRow {
  readonly product: string;
  readonly path: string;
  /** "norm 4.2 L, last time 4.0 L"; the latter once it is no longer offered. */
  readonly note: string;
  /** What was used last time, at one press while nothing is written. Never the norm: an amount nobody measured says nothing. */
  readonly offer: { readonly ml: number; readonly words: string } | undefined;
  /** Millilitres a press of minus or plus. */
  readonly by: number;
}

/** From this on a press is half a litre, below it a tenth. */
const LARGE = 2000;

/** Products used last time first, then those with a norm, then what else is written down. */
export function productRows(
  document: DraftDocument,
  norms: readonly { readonly product: string; readonly ml: number }[],
  lastTime: UsualCar['lastTime'] | undefined,
): readonly ProductRow[] {
  const last = lastTime?.products ?? [];
  const written = document.products ?? [];
  const codes = new Set([...last, ...norms, ...written].map(({ product }) => product));
  return [...codes].map((product) => {
    const norm = norms.find((one) => one.product === product)?.ml;
    const before = last.find((one) => one.product === product)?.ml;
    const now = written.find((one) => one.product === product)?.ml;
    return {
      product,
      path: `/products/${product}/ml`,
      // What is offered on a button is not said a second time above it.
      note: [
        norm === undefined ? '' : `norm ${formatVolume(norm)}`,
        now === undefined || before === undefined ? '' : `last time ${formatVolume(before)}`,
      ]
        .filter(Boolean)
        .join(', '),
      offer:
        now === undefined && before !== undefined
          ? { ml: before, words: `${formatVolume(before)}, as last time` }
          : undefined,
      by: (norm ?? before ?? now ?? 0) >= LARGE ? 500 : 100,
    };
  });
}
