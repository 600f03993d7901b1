import type { Provider } from '@angular/core';
import {
  MAT_FORM_FIELD_DEFAULT_OPTIONS,
  type MatFormFieldDefaultOptions,
} from '@angular/material/form-field';

const OPTIONS: MatFormFieldDefaultOptions = {
  appearance: 'fill',
  floatLabel: 'always',
  subscriptSizing: 'dynamic',
  hideRequiredMarker: true,
};

/** A field is a box with its label inside, always above what is typed; it grows for its message. Provided by features that have forms, so that the rest need not load fields. */
export const FIELD_DEFAULTS: Provider = {
  provide: MAT_FORM_FIELD_DEFAULT_OPTIONS,
  useValue: OPTIONS,
};
