import { DOCUMENT, inject, Injectable, signal } from '@angular/core';

/** Light, dark, or whatever the device says. */
export const THEMES = ['device', 'light', 'dark'] as const;
export type Theme = (typeof THEMES)[number];

/** Read before the first paint by `public/theme-choice.js` under the same key. */
const KEY = 'underseam.theme';

/** The theme chosen on this device. */
@Injectable({ providedIn: 'root' })
export class ThemeChoice {
  private readonly document = inject(DOCUMENT);
  private readonly chosen = signal<Theme>(this.stored());

  readonly theme = this.chosen.asReadonly();

  choose(theme: Theme): void {
    this.chosen.set(theme);
    const root = this.document.documentElement;
    if (theme === 'device') root.removeAttribute('data-theme');
    else root.setAttribute('data-theme', theme);
    try {
      if (theme === 'device') localStorage.removeItem(KEY);
      else localStorage.setItem(KEY, theme);
    } catch {
      // Storage is switched off: the choice lasts until the page is closed.
    }
  }

  private stored(): Theme {
    const shown = this.document.documentElement.getAttribute('data-theme');
    return THEMES.find((theme) => theme === shown) ?? 'device';
  }
}
