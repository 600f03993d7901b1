import { inject, Injectable, signal } from '@angular/core';
import type { FieldProblem } from '#shared/contracts/fields';
import { localDate } from '#shared/domain/calendar';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Session } from '../../core/session/session';
import type { checkDraft } from './check-draft';
import { type DraftDocument, keyedPath } from './draft-document';

type Check = typeof checkDraft;

/** The rules of a job over a draft, fetched as soon as the form is open, so that they are there without a line. */
@Injectable()
export class DraftCheck {
  private readonly catalogue = inject(Catalogue);
  private readonly role = inject(Session).role;
  private readonly rules = signal<Check | undefined>(undefined);
  /** The rules are there. */
  readonly ready = this.load();

  /** What is missing or wrong; what the server said beside it, until it is changed. */
  problems(
    document: DraftDocument,
    refused: readonly FieldProblem[],
    now: number,
  ): readonly FieldProblem[] {
    const found = this.rules()?.(document, this.world(now), new Date(now)) ?? [];
    const said = new Set(found.map(({ path }) => path));
    const more = refused
      .map(({ path, message }) => ({ path: keyedPath(document, path), message }))
      .filter(({ path }) => !said.has(path));
    return [...found, ...more];
  }

  private async load(): Promise<void> {
    const rules = await import('./check-draft');
    this.rules.set(rules.checkDraft);
  }

  /** Without a line the catalogue may be unknown: then any code is taken for now, and the server has the word. */
  private world(now: number): Parameters<Check>[1] {
    const catalogue = this.catalogue.value();
    const knows = (list: readonly { code: string }[] | undefined, code: string): boolean =>
      list === undefined || list.some((one) => one.code === code);
    return {
      today: catalogue?.today ?? localDate(new Date(now), deviceZone()),
      isProduct: (code) => knows(catalogue?.products, code),
      isPackage: (code) => knows(catalogue?.packages, code),
      ...(this.role() === 'recorder' ? { money: 'unseen' as const } : {}),
    };
  }
}

function deviceZone(): string {
  return new Intl.DateTimeFormat().resolvedOptions().timeZone;
}
