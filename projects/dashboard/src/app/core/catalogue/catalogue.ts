import { computed, effect, inject, Injectable, untracked } from '@angular/core';
import type { OutOf } from '#shared/contracts/endpoint';
import { getCatalogue } from '#shared/contracts/set-up';
import { Api } from '../api/api';
import { Line } from '../offline/line';
import { Session } from '../session/session';

type Names = Readonly<Record<string, string>>;
const NONE: Names = {};

/** The network's names, packages, products and norms, and the branches the person sees; read once a sign-in. */
@Injectable({ providedIn: 'root' })
export class Catalogue {
  private readonly session = inject(Session);
  private readonly reading = inject(Api).read(getCatalogue, () =>
    this.session.person() ? {} : undefined,
  );

  /** For pages that must say why nothing is known. */
  readonly state = this.reading;
  readonly value = this.reading.value;
  /** Today in the scope, `YYYY-MM-DD`; `undefined` until known. */
  readonly today = computed(() => this.value()?.today);
  /** ISO 4217 code of the network's currency. */
  readonly currency = computed(() => this.value()?.network.currency ?? 'EUR');
  readonly branches = computed(() => this.value()?.branches ?? []);
  readonly regions = computed(() => this.value()?.regions ?? []);
  readonly packages = computed(() => this.value()?.packages ?? []);

  private readonly branchNames = computed(() => namesOf(this.branches()));
  private readonly regionNames = computed(() => namesOf(this.regions()));
  private readonly packageNames = computed(() => namesOf(this.packages()));
  private readonly productNames = computed(() => namesOf(this.value()?.products ?? []));

  constructor() {
    const line = inject(Line);
    // What was read without a line is the answer kept from before.
    effect(() => {
      if (line.returns() > 0 && untracked(this.session.person)) this.reading.reload();
    });
  }

  /** A name by its code; the code itself when it is not (yet) known. */
  branchName(code: string): string {
    return this.branchNames()[code] ?? code;
  }
  regionName(code: string): string {
    return this.regionNames()[code] ?? code;
  }
  packageName(code: string): string {
    return this.packageNames()[code] ?? code;
  }
  /** The short word for a package where it stands among others, in rows and in the scope: its code without underscores. */
  packageWord(code: string): string {
    return code.replaceAll('_', ' ');
  }
  productName(code: string): string {
    return this.productNames()[code] ?? code;
  }

  /** Expected product of a package on a body type. */
  normsOf(
    packageCode: string,
    bodyType: string,
  ): OutOf<typeof getCatalogue>['norms'][number]['norms'] {
    const norms = this.value()?.norms ?? [];
    return (
      norms.find((norm) => norm.package === packageCode && norm.bodyType === bodyType)?.norms ?? []
    );
  }
}

function namesOf(rows: readonly { readonly code: string; readonly name: string }[]): Names {
  return rows.length === 0 ? NONE : Object.fromEntries(rows.map((row) => [row.code, row.name]));
}
