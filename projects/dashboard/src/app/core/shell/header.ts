import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatMenuModule } from '@angular/material/menu';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { Bead } from '../../ui/bead/bead';
import { Mark } from '../../ui/mark/mark';
import { homeOf } from '../session/home';
import { DangerousCount } from '../come-back/dangerous-count';
import { formatCount } from '../../ui/format';
import { Session } from '../session/session';
import { CarriedScope } from './carried-scope';
import { OpenPage } from './open-page';
import { PAGES } from './pages';
import { PersonMenu } from './person-menu';

/** Mark, page names and the person, over the seam; the bead hangs under the open page. */
@Component({
  selector: 'us-header',
  imports: [Bead, Mark, MatMenuModule, NgTemplateOutlet, PersonMenu, RouterLink, RouterLinkActive],
  templateUrl: './header.html',
  styleUrl: './header.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Header {
  private readonly session = inject(Session);
  private readonly carried = inject(CarriedScope);
  private readonly open = inject(OpenPage);

  protected readonly home = computed(() => homeOf(this.session.role()));
  protected readonly pages = computed(() =>
    PAGES.filter((page) => page.roles.some((role) => role === this.session.role())),
  );
  /** The scope goes along from page to page. */
  protected readonly query = this.carried.query;
  /** The page beside whose name the count of dangerous findings stands. */
  protected readonly counted = '/come-backs';
  protected readonly dangerous = inject(DangerousCount).dangerous;
  protected readonly formatCount = formatCount;
  protected readonly openName = this.open.name;
}
