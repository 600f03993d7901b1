import { ACCESS_TOKEN_SECONDS, issueAccessToken } from '#server/auth/access-token';
import type { Caller, PersonCaller } from '#server/auth/caller';
import { randomSecret } from '#server/auth/random-secret';
import { RefreshCookies } from '#server/auth/refresh-cookie';
import { readSecret } from '#server/auth/secret';
import { realClock, type Clock } from '#server/clock';
import { mount, type Mounting, type Reply } from '#server/http/mount';
import type { Kit } from '#server/kit';
import { findPerson, type Person } from '#db/queries/people';
import { openSignInsOf } from '#db/queries/sign-ins';
import * as contracts from '#shared/contracts/auth';
import type { OutOf } from '#shared/contracts/endpoint';
import { notFound, Refusal } from '#shared/domain/refusal';
import { listMailChoices } from '#db/queries/mail-choices';
import { changeName } from './change-name';
import { changePassword } from './change-password';
import { chooseMails } from './choose-mails';
import { endEverySignIn, signOut } from './end-sign-ins';
import { refreshSignIn } from './refresh-sign-in';
import { requestReset } from './request-reset';
import { setPassword } from './set-password';
import { signIn } from './sign-in';
import type { Opened, SignInTools } from './sign-in-tools';

/** Mounts signing in and out, and what a signed-in person does with their own account. */
export function mountSignIn(mounting: Mounting, kit: Kit, clock: Clock = realClock): void {
  const { store, passwords, outbox, config } = kit;
  const keys = readSecret(config);
  const cookies = new RefreshCookies(keys.cookies, config);
  const tools: SignInTools = { store, passwords, outbox, cookies, newToken: randomSecret, clock };
  const answer = ({ person, signIn }: Opened): Reply<OutOf<typeof contracts.signIn>> => ({
    body: {
      accessToken: issueAccessToken(
        keys.tokens,
        { personId: person.id, signInId: signIn.id },
        clock.now(),
      ),
      expiresInSeconds: ACCESS_TOKEN_SECONDS,
      person: shown(person),
    },
    headers: { 'Set-Cookie': cookies.issue(signIn) },
  });
  const signedOut = { headers: { 'Set-Cookie': cookies.clear() } };

  mount(mounting, contracts.signIn, async (call) => answer(await signIn(tools, call.body, call)));
  mount(mounting, contracts.refresh, async (call) =>
    answer(await refreshSignIn(tools, call.cookie, call)),
  );
  mount(mounting, contracts.signOut, async (call) => {
    await signOut(tools, call.cookie, call);
    return signedOut;
  });
  mount(mounting, contracts.me, ({ caller }) => {
    const person = findPerson(store.unscoped, personOf(caller).id);
    if (!person) throw notFound();
    return { body: shown(person) };
  });
  mount(mounting, contracts.changeName, async (call) => {
    const { name } = call.body;
    return { body: shown(await changeName(tools, personOf(call.caller).id, name, call)) };
  });
  mount(mounting, contracts.changePassword, async (call) => {
    await changePassword(tools, personOf(call.caller), call.body, call);
    return {};
  });
  mount(mounting, contracts.requestReset, async (call) => {
    await requestReset(tools, call.body.email, call);
    return {};
  });
  mount(mounting, contracts.setPassword, async (call) => {
    await setPassword(tools, call.body, call);
    return {};
  });
  mount(mounting, contracts.listSignIns, ({ caller }) => {
    const { id, signInId } = personOf(caller);
    const open = openSignInsOf(store.unscoped, id, clock.now().toISOString());
    return { body: { items: open.map((item) => ({ ...item, current: item.id === signInId })) } };
  });
  mount(mounting, contracts.listMailChoices, ({ caller }) => ({
    body: { items: listMailChoices(store.unscoped, personOf(caller)) },
  }));
  mount(mounting, contracts.chooseMails, async (call) => ({
    body: { items: await chooseMails(tools, personOf(call.caller), call.body.items, call) },
  }));
  mount(mounting, contracts.endSignIns, async (call) => {
    await endEverySignIn(tools, personOf(call.caller), call);
    return signedOut;
  });
}

function personOf(caller: Caller | undefined): PersonCaller {
  if (caller?.kind !== 'person') {
    throw new Refusal('forbidden', 'This call is for a person who signed in.');
  }
  return caller;
}

function shown({ id, email, name, role, regions, branches }: Person): contracts.SignedInPerson {
  return { id, email, name, role, regions, branches };
}
