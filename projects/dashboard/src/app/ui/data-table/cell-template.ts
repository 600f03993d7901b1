import { Directive, inject, input, TemplateRef } from '@angular/core';

/** A template for the cells of one column, for what words cannot do: `<ng-template usCell="bill" let-row>`. */
@Directive({ selector: 'ng-template[usCell]' })
export class CellTemplate {
  /** Key of the column. */
  readonly usCell = input.required<string>();
  readonly template = inject<TemplateRef<{ $implicit: unknown }>>(TemplateRef);
}
