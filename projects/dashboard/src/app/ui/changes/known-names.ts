import type { Catalogue } from '../../core/catalogue/catalogue';

/** What words of a change need beside the change itself. */
export interface KnownNames {
  readonly currency: string;
  readonly productName: (code: string) => string;
  readonly packageName: (code: string) => string;
  readonly branchName: (code: string) => string;
  readonly regionName: (code: string) => string;
  /** Where on the car a finding of this reference is; `undefined`: not known here. */
  readonly placeOf: (ref: string) => string | undefined;
}

/** The network's names, and the places of the findings one knows of. */
export function namesKnown(
  catalogue: Catalogue,
  placeOf: KnownNames['placeOf'] = () => undefined,
): KnownNames {
  return {
    currency: catalogue.currency(),
    productName: (code) => catalogue.productName(code),
    packageName: (code) => catalogue.packageName(code),
    branchName: (code) => catalogue.branchName(code),
    regionName: (code) => catalogue.regionName(code),
    placeOf,
  };
}
