import { computed, inject, Injectable, signal } from '@angular/core';
import { Router } from '@angular/router';
import { firstValueFrom, map, type Observable, tap } from 'rxjs';
import { refresh, signIn, signOut, type SignedInPerson } from '#shared/contracts/auth';
import type { OutOf } from '#shared/contracts/endpoint';
import { Api } from '../api/api';
import { describeProblem, type Problem } from '../api/problem';

/** Seconds before its end at which a token is no longer used, so that it does not expire on the way. */
const SPARE_SECONDS = 20;

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
    return answer.person;
  }

  private forget(): void {
    this.token = undefined;
    this.who.set(undefined);
  }
}
