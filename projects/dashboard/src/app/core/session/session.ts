import { computed, inject, Injectable, signal } from '@angular/core';
import { Router } from '@angular/router';
import { firstValueFrom, map, type Observable, tap } from 'rxjs';
import { refresh, signIn, signOut, type SignedInPerson } from '#shared/contracts/auth';
import type { OutOf } from '#shared/contracts/endpoint';
import { Api } from '../api/api';
import { describeProblem, type Problem } from '../api/problem';
import { forgetAnswers } from '../offline/kept-answers';
import { keepPerson, keptPerson } from './kept-person';

/** Seconds before its end at which a token is no longer used, so that it does not expire on the way. */
const SPARE_SECONDS = 20;
/** How long the start waits for the server before it opens for whoever was signed in last on this device, ms. */
const START_PATIENCE = 4_000;

/** Who is signed in. The access token lives in memory only; the refresh cookie is the browser's, out of reach of scripts. */
@Injectable({ providedIn: 'root' })
export class Session {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private token: { readonly text: string; readonly usableUntil: number } | undefined;
  private renewing: Promise<string | undefined> | undefined;
  private readonly who = signal<SignedInPerson | undefined>(undefined);
  private readonly trouble = signal<Problem | undefined>(undefined);

  /** The person signed in, or `undefined`. */
  readonly person = this.who.asReadonly();
  readonly role = computed(() => this.who()?.role);
  /** Why the last sign-in could not be resumed, when the server could not be asked. */
  readonly resumeProblem = this.trouble.asReadonly();

  /**
   * At the start of the application: goes on with the sign-in of before. Without a line, or when the answer is slow to come,
   * with the last person on this device: the shell and their drafts open, whatever needs a token waits.
   */
  async resume(): Promise<void> {
    const renewed = this.renew();
    const last = keptPerson();
    if (!last) {
      await renewed;
      return;
    }
    let timer: ReturnType<typeof setTimeout> | undefined;
    const slow = new Promise<'slow'>((resolve) => {
      timer = setTimeout(() => resolve('slow'), START_PATIENCE);
    });
    const outcome = await Promise.race([renewed, slow]);
    clearTimeout(timer);
    const status = this.trouble()?.status;
    const unanswered = outcome === 'slow' || status === 0 || (status ?? 0) >= 502;
    if (this.who() || !unanswered) return;
    this.who.set(last);
    // Told later that this sign-in has ended: sign in again, and come back here.
    void renewed.then(() => {
      if (!this.who()) this.end(this.router.url);
    });
  }

  signIn(email: string, password: string): Observable<SignedInPerson> {
    return this.api
      .call(signIn, { body: { email, password } })
      .pipe(map((answer) => this.keep(answer.body)));
  }

  /** A token that is good for a call now, renewed first when it is nearly over. */
  async usableToken(): Promise<string | undefined> {
    if (this.token && performance.now() < this.token.usableUntil) return this.token.text;
    return this.renew();
  }

  /** Exchanges the cookie for a new token; calls that need one at the same time share one exchange. */
  renew(): Promise<string | undefined> {
    this.renewing ??= this.exchange().finally(() => (this.renewing = undefined));
    return this.renewing;
  }

  /** Signs out here; the cookie goes too. When the server cannot be told, the person stays signed in and is told so. */
  signOut(): Observable<unknown> {
    return this.api.call(signOut, {}).pipe(tap(() => this.end()));
  }

  /** Forgets who was signed in and asks for a new sign-in, to come back to where they were. */
  end(backTo?: string): void {
    this.forget();
    const queryParams = backTo && backTo !== '/' ? { next: backTo } : {};
    void this.router.navigate(['/sign-in'], { queryParams });
  }

  /** Takes over a changed name or role. */
  update(person: SignedInPerson): void {
    this.who.set(person);
    keepPerson(person);
  }

  private async exchange(): Promise<string | undefined> {
    try {
      const answer = await firstValueFrom(this.api.call(refresh, {}));
      this.trouble.set(undefined);
      this.keep(answer.body);
      return answer.body.accessToken;
    } catch (error) {
      const problem = describeProblem(error);
      // No line is no reason to sign anybody out: the cookie may still be good.
      if (problem.status === 401 || problem.status === 403) this.forget();
      else this.trouble.set(problem);
      return undefined;
    }
  }

  private keep(answer: OutOf<typeof signIn>): SignedInPerson {
    const seconds = Math.max(0, answer.expiresInSeconds - SPARE_SECONDS);
    this.token = { text: answer.accessToken, usableUntil: performance.now() + seconds * 1000 };
    this.who.set(answer.person);
    keepPerson(answer.person);
    return answer.person;
  }

  private forget(): void {
    this.token = undefined;
    this.who.set(undefined);
    keepPerson(undefined);
    forgetAnswers();
  }
}
