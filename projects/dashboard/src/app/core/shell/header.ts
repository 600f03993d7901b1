import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatMenuModule } from '@angular/material/menu';
import { RouterLink, RouterLinkActive } from '@angular/router';
import type { Role } from '#shared/domain/vocabulary';
import { Bead } from '../../ui/bead/bead';
import { Mark } from '../../ui/mark/mark';
import { DangerousCount } from '../come-back/dangerous-count';
import { OutboxStateLine } from '../drafts/outbox-state';
import { UnsentHere } from '../drafts/unsent-here';
import { Line } from '../offline/line';
import { formatCount } from '../../ui/format';
import { Session } from '../session/session';
import { CarriedScope } from './carried-scope';
import { OpenPage } from './open-page';
import { PAGES } from './pages';
import { PersonMenu } from './person-menu';

/** Mark, page names and the person, over the seam; the bead hangs under the open page. */
@Component({
  selector: 'us-header',
  imports: [
    Bead,
    Mark,
    MatMenuModule,
    NgTemplateOutlet,
    OutboxStateLine,
    PersonMenu,
    RouterLink,
    RouterLinkActive,
  ],
  templateUrl: './header.html',
  styleUrl: './header.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Header {
  private readonly session = inject(Session);
  private readonly carried = inject(CarriedScope);
  private readonly open = inject(OpenPage);
  private readonly line = inject(Line);
  private readonly unsent = inject(UnsentHere);

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
  /** Something of this person's waits on the device, or there is no line: only then what sends is loaded. *Send a job* says it itself. */
  protected readonly outbox = computed(
    () =>
      maySend(this.session.role()) &&
      this.openName() !== 'Send a job' &&
      (this.unsent.mine().waiting > 0 || this.line.down()),
  );
}

function maySend(role: Role | undefined): boolean {
  return role !== undefined && role !== 'regional_lead';
}
