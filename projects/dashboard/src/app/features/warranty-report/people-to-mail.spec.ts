import { peopleToMail } from './people-to-mail';

const person = (id: number, more: object = {}) => ({
  id,
  email: `p${id}@underseam.example`,
  name: `Person ${id}`,
  role: 'head_office' as const,
  regions: [],
  branches: [],
  active: true,
  invited: false,
  lastSignInAt: null,
  ...more,
});

describe('peopleToMail', () => {
  it('of everybody, offers those of head office who can sign in', () => {
    const people = [person(1), person(2, { role: 'recorder' }), person(3, { active: false })];
    expect(peopleToMail(people, []).map(({ id }) => id)).toEqual([1]);
  });

  it('of those chosen before, keeps who no longer can be and says why', () => {
    const people = [person(2, { role: 'recorder' }), person(3, { active: false })];
    expect(peopleToMail(people, [2, 3]).map(({ trouble }) => trouble)).toEqual([
      'no longer of head office: take the tick out',
      'turned off: take the tick out',
    ]);
  });
});
