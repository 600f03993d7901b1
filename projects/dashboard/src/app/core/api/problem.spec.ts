import { HttpErrorResponse, HttpHeaders } from '@angular/common/http';
import { describeProblem, fieldMessage } from './problem';

function response(status: number, error?: unknown, headers: Record<string, string> = {}) {
  return new HttpErrorResponse({ status, error, headers: new HttpHeaders(headers) });
}

describe('describeProblem', () => {
  it('without an answer says that nothing typed is lost', () => {
    const problem = describeProblem(response(0));
    expect(problem.status).toBe(0);
    expect(problem.sentence).toMatch(/No answer from the server.*Nothing typed here is lost/);
  });

  it('of a 422 keeps the detail and every field problem', () => {
    const problem = describeProblem(
      response(422, {
        type: 'about:blank',
        title: 'Unprocessable',
        status: 422,
        detail: '2 things to put right',
        problems: [
          { path: '/newPassword', message: 'a password has at least 12 characters' },
          { path: '/currentPassword', message: 'is wrong' },
        ],
      }),
    );
    expect(problem.sentence).toBe('2 things to put right.');
    expect(fieldMessage(problem, '/newPassword')).toBe('a password has at least 12 characters');
    expect(fieldMessage(problem, '/currentPassword')).toBe('is wrong');
    expect(fieldMessage(problem, '/name')).toBeUndefined();
  });

  it('of a 412 names who changed it and that nothing was written', () => {
    const problem = describeProblem(response(412, { detail: 'Ilse Torven changed it at 14:05' }));
    expect(problem.sentence).toBe(
      'Ilse Torven changed it at 14:05. Nothing was written; load it again to see the change.',
    );
  });

  it.each([
    ['20', 'Wait 20 seconds'],
    ['900', 'Wait 15 minutes'],
    [undefined, 'Wait a while'],
  ])('of a 429 with Retry-After %s says how long to wait', (after, words) => {
    const headers: Record<string, string> = after ? { 'Retry-After': after } : {};
    expect(describeProblem(response(429, {}, headers)).sentence).toContain(words);
  });

  it('of a document that came as text (an export) reads it all the same', () => {
    const text = JSON.stringify({ detail: 'the region is not known' });
    expect(describeProblem(response(422, text)).sentence).toBe('the region is not known.');
  });

  it('of a page of HTML from a proxy says nothing of its markup', () => {
    const problem = describeProblem(response(502, '<html>Bad gateway</html>'));
    expect(problem.sentence).not.toContain('<');
    expect(problem.fields).toEqual([]);
  });

  it('of an error wrapped by a resource looks at its cause', () => {
    const wrapped = new Error('wrapped', { cause: response(403) });
    expect(describeProblem(wrapped).sentence).toBe('Your role does not include this.');
  });

  it('of malformed field problems drops them rather than failing', () => {
    const problem = describeProblem(response(422, { detail: 'x', problems: [null, { path: 1 }] }));
    expect(problem.fields).toEqual([]);
  });
});
