import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  numberAttribute,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { inviteAgain, listPeople } from '#shared/contracts/people';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { deed } from '../../core/api/deed';
import type { Problem } from '../../core/api/problem';
import { formatInstant } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { ChangeForm } from '../../ui/set-up/change-form';
import { activity, type Person, personChange } from '../../ui/set-up/person-changes';
import { Trouble } from '../../ui/trouble/trouble';
import { standingWords } from './person-words';
import { WhoChanged } from './who-changed';

/** One person: name, role and scope; and whether they can sign in. */
@Component({
  selector: 'us-person-page',
  imports: [ChangeForm, LoadState, MatButton, RouterLink, Trouble, WhoChanged],
  templateUrl: './person-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonPage {
  /** From the address. */
  readonly id = input.required({ transform: numberAttribute });

  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  protected readonly people = this.api.read(listPeople, () => ({}));
  protected readonly person = computed(() =>
    this.people.value()?.items.find(({ id }) => id === this.id()),
  );
  protected readonly form = computed(() => {
    const person = this.person();
    const { regions, branches } = this.catalogue;
    return person && personChange(this.api, { regions: regions(), branches: branches() }, person);
  });
  protected readonly said = signal('');
  protected readonly standing = standingWords;
  protected readonly time = formatInstant;
  protected readonly turning = deed(({ person, active }: { person: Person; active: boolean }) =>
    activity(this.api, person, active),
  );
  protected readonly inviting = deed((id: number) =>
    this.api.call(inviteAgain, { params: { id } }),
  );

  /** What stands against it in a sentence of its own: there is no field here to say it at. */
  protected refusal({ fields, sentence }: Problem): string {
    const message = fields[0]?.message;
    return message ? `${message.charAt(0).toUpperCase()}${message.slice(1)}.` : sentence;
  }

  protected async turn(person: Person, active: boolean): Promise<void> {
    this.said.set('');
    if (!(await this.turning.run({ person, active }))) return;
    this.said.set(active ? 'Turned on again.' : 'Turned off, and signed out everywhere.');
    this.people.reload();
  }

  protected async invite({ id, email }: Person): Promise<void> {
    this.said.set('');
    if (await this.inviting.run(id)) this.said.set(`A new invitation is on its way to ${email}.`);
  }
}
