import type { Observable } from 'rxjs';
import type { PlannedChange } from '#shared/contracts/set-up-help';
import type { Answer } from '../../core/api/api';
import type { Field, Typed } from './field';

/** One change of set-up: its fields, what stands in them, what it would move, and how it is saved. */
export interface ChangeOf<Out> {
  /** What the form is, for those who hear it. */
  readonly label: string;
  /** What the button says it does. */
  readonly act: string;
  readonly fields: readonly Field[];
  /** What stands in the fields as long as nobody has typed over it. */
  readonly start: Typed;
  /** What is wrong with fields taken together, by the name of the field it is said at. */
  readonly check?: (typed: Typed) => Readonly<Record<string, string>>;
  /** What it would move; left out, or nothing, where no figure moves. */
  readonly change?: (typed: Typed) => PlannedChange | undefined;
  readonly save: (typed: Typed) => Observable<Answer<Out>>;
  /** `clear`: the form is as at first again once it was taken, for the next one. */
  readonly after?: 'clear';
}
