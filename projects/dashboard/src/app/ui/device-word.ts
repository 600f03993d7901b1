import { computed, type Signal } from '@angular/core';
import { windowIs } from './narrow';

/** What to call this device: a finger points at a phone, with a mouse it is some other one. Call it in an injection context. */
export function deviceWord(): Signal<'phone' | 'device'> {
  const finger = windowIs('(pointer: coarse)');
  return computed(() => (finger() ? 'phone' : 'device'));
}
