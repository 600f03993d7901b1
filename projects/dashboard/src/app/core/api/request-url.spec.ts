import { requestUrl } from './request-url';

describe('requestUrl', () => {
  it('with a reference that holds a slash keeps it one segment', () => {
    expect(
      requestUrl('/api/branches/:branch/jobs/:jobRef', { branch: 'HAV', jobRef: '04/17 ä' }),
    ).toBe('/api/branches/HAV/jobs/04%2F17%20%C3%A4');
  });

  it('with arrays repeats the name and leaves out what is undefined, null or empty', () => {
    expect(
      requestUrl('/api/jobs', {}, { branch: ['HAV', 'TAN'], region: [], q: undefined, make: null }),
    ).toBe('/api/jobs?branch=HAV&branch=TAN');
  });

  it('with flags and numbers writes them as words', () => {
    expect(requestUrl('/api/jobs', {}, { unbilled: true, hasRot: false, limit: 50 })).toBe(
      '/api/jobs?unbilled=true&hasRot=false&limit=50',
    );
  });

  it('without a value for a name in the path refuses', () => {
    expect(() => requestUrl('/api/branches/:branch/jobs/:jobRef', { branch: 'HAV' })).toThrow(
      /jobRef/,
    );
  });
});
