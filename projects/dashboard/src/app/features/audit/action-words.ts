/** What somebody did, as it reads after their name: `job.void` → `voided a job`. An action not named here is read from its code. */
export function actionWords(action: string): string {
  if (Object.hasOwn(ACTION_WORDS, action)) return ACTION_WORDS[action] ?? action;
  const [thing = '', verb = ''] = action.split('.');
  const words = (code: string): string => code.replaceAll('-', ' ');
  if (thing === 'export') return `fetched a file of rows: ${words(verb)}`;
  return verb ? `${words(thing)}: ${words(verb)}` : words(thing);
}

/** Every action the trail is known to hold, with its words. */
export const ACTION_WORDS: Readonly<Record<string, string>> = {
  'job.correct': 'corrected a job',
  'job.void': 'voided a job',
  'job.restore': 'brought back a job',
  'photo.replace': 'replaced a photo',
  'photo.remove': 'removed a photo',
  'booking.set': 'took down a booking',
  'booking.remove': 'took out a booking',
  'under-way.drop': 'dropped a job under way',
  'import.write': 'began to write an imported file',
  'import.end': 'had an imported file written, as far as it says',
  'claim.make': 'took down a claim',
  'claim.correct': 'corrected a claim',
  'come-back.mark': 'marked what was left on a car',
  'signal.acknowledge': 'took note of a signal',
  'week.note': 'wrote the note on a week',
  'action.agree': 'agreed an action with a branch',
  'action.change': 'changed an action, ended it or took it up again',
  'action.answer': 'answered an action',
  'target.network': 'set a target of the network',
  'target.branch': 'set a target of a branch',
  'network.set': 'changed the network',
  'region.set': 'set up a region',
  'branch.set': 'set up a branch',
  'product.set': 'set up a product',
  'package.set': 'set up a package',
  'product.remove': 'took a product out',
  'package.remove': 'took a package out',
  'cost.set': 'set a cost, rate or fee',
  'norm.set': 'set the norm of a package',
  'key.add': 'made a push key',
  'key.revoke': 'revoked a push key',
  'person.add': 'added a person',
  'person.change': 'changed a person',
  'person.invite': 'invited a person again',
  'person.mails': 'chose which mails to receive',
  'person.rename': 'changed their own name',
  'password.set': 'set a password by a mailed link',
  'password.change': 'changed their password',
  'password.reset-request': 'asked for a new password',
  'sign-in.start': 'signed in',
  'sign-in.end': 'signed out',
  'sign-in.end-all': 'signed out everywhere',
  'sign-in.lock-out': 'was locked out after wrong passwords',
  'sign-in.reused-cookie': 'showed a sign-in that was used already; it was ended',
  'export.jobs': 'fetched a file of jobs',
  'export.margin': 'fetched a file of the weekly margin',
  'export.overrun': 'fetched a file of overruns',
  'export.rot': 'fetched a file of rot',
  'export.audit': 'fetched a file of the audit trail',
  'export.warranty-report': 'fetched a warranty report as a file',
  'warranty-report.issue': 'issued a warranty report',
  'warranty-schedule.set': 'set when the warranty report is issued and mailed',
  'database.restore': 'put a backup in place',
  'demo.make': 'made the demo network',
};

/** Kinds of action to choose together, by the beginning of their codes. */
export const ACTION_KINDS: readonly { readonly value: string; readonly words: string }[] = [
  { value: 'job.', words: 'Jobs corrected, voided, brought back' },
  { value: 'claim.', words: 'Claims' },
  { value: 'cost.', words: 'Costs, rates and fees' },
  { value: 'import.', words: 'Imported files' },
  { value: 'person.', words: 'People' },
  { value: 'key.', words: 'Push keys' },
  { value: 'password.', words: 'Passwords' },
  { value: 'sign-in.', words: 'Sign-ins' },
  { value: 'export.', words: 'Files fetched' },
];
