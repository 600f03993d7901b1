import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Session } from '../../core/session/session';
import { formatList } from '../../ui/format';
import { ROLE_NAMES } from '../../ui/words';
import { MailChoices } from './mail-choices';
import { NameForm } from './name-form';
import { PasswordForm } from './password-form';
import { SignInsList } from './sign-ins-list';

/** The own account: name, password, the mails one wants, and the devices one is signed in on. */
@Component({
  selector: 'us-account-page',
  imports: [MailChoices, NameForm, PasswordForm, SignInsList],
  templateUrl: './account-page.html',
  styleUrl: './account-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AccountPage {
  private readonly catalogue = inject(Catalogue);
  protected readonly person = inject(Session).person;
  /** Role and what it covers, as head office set it. */
  protected readonly standing = computed(() => {
    const person = this.person();
    if (!person) return '';
    const places = [
      ...person.regions.map((code) => this.catalogue.regionName(code)),
      ...person.branches.map((code) => this.catalogue.branchName(code)),
    ];
    const role = ROLE_NAMES[person.role];
    return places.length > 0 ? `${role} of ${formatList(places)}` : role;
  });
}
