import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { listPeople } from '#shared/contracts/people';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { formatInstant } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { ChangeForm } from '../../ui/set-up/change-form';
import { addPersonChange, type Person } from '../../ui/set-up/person-changes';
import { ROLE_NAMES } from '../../ui/words';
import { placesWords, standingWords } from './person-words';
import { WhoChanged } from './who-changed';

/** Everybody with a sign-in, and the way to invite another. */
@Component({
  selector: 'us-people-page',
  imports: [ChangeForm, DataTable, LoadState, WhoChanged],
  templateUrl: './people-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeoplePage {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  protected readonly people = this.api.read(listPeople, () => ({}));
  protected readonly said = signal('');
  protected readonly columns = computed((): Column<Person>[] => [
    {
      key: 'name',
      label: 'Name',
      text: ({ name }) => name,
      quiet: ({ email }) => email,
      link: ({ id }) => ({ commands: ['/set-up/people', id] }),
      sortBy: ({ name }) => name,
    },
    {
      key: 'role',
      label: 'Role',
      text: ({ role }) => ROLE_NAMES[role],
      sortBy: ({ role }) => ROLE_NAMES[role],
    },
    { key: 'sees', label: 'Sees', text: (person) => placesWords(person, this.catalogue) },
    {
      key: 'last',
      label: 'Last sign-in',
      text: ({ lastSignInAt }) => (lastSignInAt ? formatInstant(lastSignInAt) : 'never'),
      muted: ({ lastSignInAt }) => lastSignInAt === null,
      sortBy: ({ lastSignInAt }) => lastSignInAt,
      firstSort: 'desc',
    },
    {
      key: 'standing',
      label: 'Standing',
      text: standingWords,
      strong: ({ active }) => !active,
      sortBy: standingWords,
    },
  ]);
  protected readonly form = computed(() =>
    addPersonChange(this.api, {
      regions: this.catalogue.regions(),
      branches: this.catalogue.branches(),
    }),
  );

  protected added({ name, email, invited }: Person): void {
    this.said.set(
      invited
        ? `${name} is invited: the link mailed to ${email} works for seven days.`
        : `${name} can sign in with the password you set.`,
    );
    this.people.reload();
  }
}
