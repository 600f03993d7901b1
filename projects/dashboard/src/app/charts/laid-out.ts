import { computed, type Signal } from '@angular/core';
import { measuredWidth } from './measured-width';

/** What a chart draws: its data laid out for the width of the host element, nothing until that is known. */
export function laidOut<Data, Picture>(
  data: Signal<Data>,
  layOut: (data: Data, width: number) => Picture,
): Signal<Picture | undefined> {
  const width = measuredWidth();
  return computed(() => (width() > 0 ? layOut(data(), width()) : undefined));
}
