import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatMenuModule } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { deed } from '../api/deed';
import { UnsentHere } from '../drafts/unsent-here';
import { Session } from '../session/session';
import { ROLE_NAMES } from '../../ui/words';
import { type Theme, ThemeChoice, THEMES } from './theme-choice';

const THEME_NAMES: Readonly<Record<Theme, string>> = {
  device: 'Light or dark as the device',
  light: 'Light',
  dark: 'Dark',
};

/** The person's name at the right of the header and what belongs to them: account, theme, help, sign-out. */
@Component({
  selector: 'us-person-menu',
  imports: [MatMenuModule, RouterLink],
  templateUrl: './person-menu.html',
  styleUrl: './person-menu.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonMenu {
  private readonly session = inject(Session);
  private readonly choice = inject(ThemeChoice);

  protected readonly person = this.session.person;
  protected readonly roleName = computed(() => {
    const role = this.session.role();
    return role ? ROLE_NAMES[role] : '';
  });
  protected readonly headOffice = computed(() => this.session.role() === 'head_office');
  protected readonly mayImport = computed(
    () => this.headOffice() || this.session.role() === 'site_manager',
  );
  protected readonly themes = THEMES.map((theme) => ({ theme, name: THEME_NAMES[theme] }));
  protected readonly theme = this.choice.theme;
  protected readonly leaving = deed(() => this.session.signOut());
  private readonly unsent = inject(UnsentHere);
  /** Jobs that stay behind on this device when the person signs out. */
  protected readonly staying = computed(() => {
    const { editing, waiting } = this.unsent.mine();
    return editing + waiting;
  });

  protected choose(theme: Theme): void {
    this.choice.choose(theme);
  }
}
