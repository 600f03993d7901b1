import { subjectOf } from './subject-words';

const NAMES = {
  branchName: (code: string) => (code === 'HAV' ? 'Havnsund' : code),
  regionName: (code: string) => (code === 'C' ? 'Coast' : code),
  productName: (code: string) => (code === 'CW1' ? 'Cavity wax' : code),
  packageName: (code: string) => code,
  personName: (id: number) => (id === 7 ? 'Runa Felde' : undefined),
};
const said = (path: string) => subjectOf(path, NAMES);

describe('subjectOf', () => {
  it.each([
    ['/branches/HAV/jobs/0417', 'job 0417, Havnsund', ['/jobs', 'HAV', '0417']],
    ['/branches/HAV/jobs/a/b', 'job a/b, Havnsund', ['/jobs', 'HAV', 'a/b']],
    ['/branches/HAV/jobs/0417/photos/x', 'a photo of job 0417, Havnsund', ['/jobs', 'HAV', '0417']],
    [
      '/branches/HAV/come-back/0417/floor/left/1',
      'floor, left, on job 0417, Havnsund',
      ['/jobs', 'HAV', '0417'],
    ],
    ['/branches/HAV/claims/C-1', 'claim C-1, Havnsund', undefined],
    ['/branches/HAV', 'branch Havnsund', ['/set-up/branches', 'HAV']],
    ['/branches/HAV/keys/k1', 'push key k1, Havnsund', ['/set-up/branches', 'HAV']],
    ['/regions/C', 'region Coast', ['/set-up/regions', 'C']],
    ['/people/7', 'Runa Felde', ['/set-up/people', '7']],
    ['/people/8', 'person 8', ['/set-up/people', '8']],
    ['/exports/jobs.csv', 'the file jobs.csv', undefined],
    ['/packages/full/norms/van', 'package full, norm on van', ['/set-up/packages', 'full']],
    ['/something/else', '/something/else', undefined],
  ])('of %s, says %s', (path, words, link) => {
    expect(said(path)).toMatchObject({ words });
    expect(said(path).link).toEqual(link);
  });

  it('of a dated cost, says from when', () => {
    expect(said('/products/CW1/costs/2026-01-01').words).toMatch(
      /^Cavity wax, cost of a litre from .*2026$/,
    );
    expect(said('/branches/HAV/rates/2026-01-01').words).toMatch(/^Havnsund, hourly cost from/);
    expect(said('/network/fees/2026-01-01').words).toMatch(/^network fee from/);
  });

  it('of the note on a week, leads to that week of that branch', () => {
    expect(said('/branches/HAV/weeks/2026-W05/note')).toEqual({
      words: 'Week 5, 2026, Havnsund',
      link: ['/this-week'],
      query: { branch: 'HAV', week: '2026-W05' },
    });
  });
});
