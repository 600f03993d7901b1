import { lackOf, nextSteps } from './next-steps';

describe('lackOf', () => {
  it.each([
    ['branches', { branches: 0, packages: 0, jobs: 0 }],
    ['packages', { branches: 2, packages: 0, jobs: 0 }],
    ['jobs', { branches: 2, packages: 3, jobs: 0 }],
    [undefined, { branches: 2, packages: 3, jobs: 1 }],
  ])('what comes first, %s, of %o', (lack, network) => {
    expect(lackOf(network)).toBe(lack);
  });
});

describe('nextSteps', () => {
  it('a branch without jobs, a recorder, sends the first one of that branch', () => {
    expect(nextSteps('jobs', 'recorder', 'HAV').steps).toEqual([
      { words: 'Send the first job', link: '/send', query: { branch: 'HAV' } },
    ]);
  });

  it('a branch without jobs, a site manager, sends or imports', () => {
    const links = nextSteps('jobs', 'site_manager').steps.map((step) => step.link);
    expect(links).toEqual(['/send', '/import']);
  });

  it('no branch, head office, is led through the first steps', () => {
    expect(nextSteps('branches', 'head_office').steps.map((step) => step.link)).toEqual([
      '/first-run',
    ]);
  });

  it.each(['recorder', 'site_manager', 'regional_lead'] as const)(
    'no branch or package, a %s, is told whom to ask and is led nowhere they may not go',
    (role) => {
      for (const lack of ['branches', 'packages'] as const) {
        expect(nextSteps(lack, role).why).toContain('Ask head office');
        expect(nextSteps(lack, role).steps).toEqual([]);
      }
    },
  );

  it('a branch without jobs, a regional lead, is led to no page of writing', () => {
    expect(nextSteps('jobs', 'regional_lead').steps).toEqual([]);
  });
});
