import type { Params } from '@angular/router';
import type { Role } from '#shared/domain/vocabulary';

/** What stands in the way of figures, if anything does. */
export type Lack = 'branches' | 'packages' | 'jobs';

/** Something to do next and the page on which it is done. */
export interface NextStep {
  readonly words: string;
  readonly link: string;
  readonly query?: Params;
}

/** Why there is nothing to see, and what this person can do about it. */
export interface NextSteps {
  readonly why: string;
  readonly steps: readonly NextStep[];
}

/** The first thing that is missing; `undefined` when there are jobs. */
export function lackOf(network: {
  readonly branches: number;
  readonly packages: number;
  readonly jobs: number;
}): Lack | undefined {
  if (network.branches === 0) return 'branches';
  if (network.packages === 0) return 'packages';
  return network.jobs === 0 ? 'jobs' : undefined;
}

/** What to do next, in the terms of a role; `branch` is the one chosen, so that it goes along. */
export function nextSteps(lack: Lack, role: Role, branch?: string): NextSteps {
  if (lack === 'jobs') return firstJob(role, branch === undefined ? {} : { query: { branch } });
  if (role === 'head_office') {
    return {
      why:
        lack === 'branches'
          ? 'This network has no branch yet, so no job can be sent.'
          : 'No package of work is set up yet, so no job can be sent.',
      steps: [FIRST_STEPS],
    };
  }
  return {
    why:
      lack === 'branches'
        ? 'No branch is given to you yet, so there is nothing to see. Ask head office: they give it in Set-up, under people.'
        : 'No package of work is set up yet, so no job can be sent. Ask head office: they do it in Set-up.',
    steps: [],
  };
}

const FIRST_STEPS: NextStep = { words: 'Go through the first steps', link: '/first-run' };

function firstJob(role: Role, along: Pick<NextStep, 'query'>): NextSteps {
  const send: NextStep = { words: 'Send the first job', link: '/send', ...along };
  const file: NextStep = { words: 'Import a file of earlier jobs', link: '/import', ...along };
  switch (role) {
    case 'recorder':
      return {
        why: 'No car is recorded here yet. Each car that you send is kept here and can be corrected.',
        steps: [send],
      };
    case 'site_manager':
      return {
        why: 'No car is recorded here yet. Send the next one as it is finished, or bring in earlier ones from a spreadsheet.',
        steps: [send, file],
      };
    case 'regional_lead':
      return {
        why: 'No car is recorded here yet. The branches send their own; figures appear with their first cars, so ask their site managers when they begin.',
        steps: [],
      };
    case 'head_office':
      return {
        why: 'No car is recorded here yet. The branches send theirs as they finish them; earlier ones come in from a file.',
        steps: [send, file, FIRST_STEPS],
      };
  }
}
