import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterOutlet } from '@angular/router';
import { LiveLine } from '../live/live-line';
import { Footer } from './footer';
import { Header } from './header';
import { NewerVersionLine } from './newer-version-line';
import { RouteAnnouncer } from './route-announcer';

/** The frame of every page of a signed-in person: skip link, header, page, footer. */
@Component({
  selector: 'us-shell',
  imports: [Footer, Header, LiveLine, NewerVersionLine, RouteAnnouncer, RouterOutlet],
  template: `
    <a class="skip" href="#page" (click)="skip($event, page)">Skip to the page</a>
    <us-header class="us-unprinted" />
    <us-newer-version-line class="us-unprinted" />
    <main #page id="page" tabindex="-1" [usRouteAnnouncer]="page"><router-outlet /></main>
    <us-footer class="us-unprinted" />
    <us-live-line class="us-unprinted" />
  `,
  styles: `
    :host {
      display: flex;
      flex-direction: column;
      min-height: 100dvh;
    }
    main {
      flex: 1;
      min-width: 0;
    }
    main:focus {
      outline: none;
    }
    .skip {
      position: absolute;
      z-index: 2;
      left: 16px;
      top: -60px;
      padding: 10px 16px;
      border-radius: var(--us-radius);
      background: var(--us-ink);
      color: var(--us-paper);
    }
    .skip:focus {
      top: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  /** Moves the focus itself: a plain fragment link would leave the page's address for the base's. */
  protected skip(event: Event, page: HTMLElement): void {
    event.preventDefault();
    page.focus();
  }
}
