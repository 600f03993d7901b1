import { checkPreconditions, tagOf } from './preconditions';
import { Refusal } from './refusal';

const check = (
  headers: { ifMatch?: string; ifNoneMatch?: string },
  stored?: { revision: number; voided: boolean },
): string | undefined => {
  try {
    checkPreconditions(
      {
        ifMatch: undefined,
        ifNoneMatch: undefined,
        ...headers,
        lastChange: () => 'by Ada at noon',
      },
      stored,
    );
    return undefined;
  } catch (error) {
    if (!(error instanceof Refusal) || error.kind !== 'precondition') throw error;
    return error.detail;
  }
};
const at3 = { revision: 3, voided: false };

describe('checkPreconditions', () => {
  it('given no header, lets everything pass', () => {
    expect(check({})).toBeUndefined();
    expect(check({}, at3)).toBeUndefined();
  });

  it('given If-Match, passes on the present tag, on a list with it and on *', () => {
    for (const ifMatch of [tagOf(3), `"r1" , ${tagOf(3)}`, '*']) {
      expect(check({ ifMatch }, at3)).toBeUndefined();
    }
  });

  it('given If-Match of another state, refuses and names who changed it (rule 73)', () => {
    for (const ifMatch of ['"r2"', 'r3', '"r33"', `W/${tagOf(3)}`, '']) {
      expect(check({ ifMatch }, at3)).toContain('by Ada at noon');
    }
  });

  it('given If-Match and nothing there, or something voided, refuses', () => {
    expect(check({ ifMatch: '*' })).toContain('not there');
    expect(check({ ifMatch: tagOf(3) }, { ...at3, voided: true })).toContain('not there');
  });

  it('given If-None-Match *, refuses only what is there, and names who wrote it', () => {
    expect(check({ ifNoneMatch: '*' }, at3)).toContain('by Ada at noon');
    expect(check({ ifNoneMatch: '*' })).toBeUndefined();
    expect(check({ ifNoneMatch: '*' }, { ...at3, voided: true })).toBeUndefined();
  });
});
