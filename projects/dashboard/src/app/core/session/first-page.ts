import type { Injector } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { getCatalogue } from '#shared/contracts/set-up';
import { Api } from '../api/api';
import { homeOf } from './home';

/** The first page of head office: First steps until there is a branch and a package, then as for others. */
export async function firstPage(injector: Injector): Promise<string> {
  try {
    const { body } = await firstValueFrom(injector.get(Api).call(getCatalogue, {}));
    const begun = body.branches.length > 0 && body.packages.length > 0;
    return begun ? homeOf('head_office') : '/first-run';
  } catch {
    // Where the catalogue cannot be asked, the page that is opened says so itself.
    return homeOf('head_office');
  }
}
