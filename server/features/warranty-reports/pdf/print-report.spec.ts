import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import PDFDocument from 'pdfkit';
import { root } from '../../../../test/support/project-files';
import { sampleReport, type SampleSize } from '../../../../test/support/sample-report';
import { Fonts } from './fonts';
import { namesOf } from './names';
import { printReport } from './print-report';

const sha256 = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex');
const pagesOf = (pdf: Buffer): number => pdf.toString('latin1').split('/Type /Page\n').length - 1;

/** Prints the same sample in a process of its own, in another place of the world and on another day of the clock. */
function printedElsewhere(size: SampleSize): string {
  const program = `
    const { createHash } = require('node:crypto');
    const { printReport } = require('./server/features/warranty-reports/pdf/print-report');
    const { sampleReport } = require('./test/support/sample-report');
    const pdf = printReport(sampleReport(${JSON.stringify(size)}));
    process.stdout.write(createHash('sha256').update(pdf).digest('hex'));`;
  const flags = ['--import', 'tsx', '--conditions=underseam-source', '-e'];
  return execFileSync(process.execPath, [...flags, program], {
    cwd: root,
    env: { PATH: process.env['PATH'], TZ: 'Pacific/Auckland', LANG: 'de_DE.UTF-8' },
    encoding: 'utf8',
  });
}

describe('printReport', () => {
  it('given the same report, makes the same bytes, in another process and time zone too', () => {
    const size = { branches: 3, cohorts: 4 };
    const first = sha256(printReport(sampleReport(size)));
    expect(sha256(printReport(sampleReport(size)))).toBe(first);
    expect(printedElsewhere(size)).toBe(first);
  }, 60_000);

  it('given another figure, makes other bytes', () => {
    const report = sampleReport({ branches: 1, cohorts: 3 });
    const other = { ...report, answer: { ...report.answer, covered: report.answer.covered + 1 } };
    expect(sha256(printReport(other))).not.toBe(sha256(printReport(report)));
  });

  it.each<[string, SampleSize, number]>([
    ['an empty network', { branches: 0, cohorts: 0, groups: 0 }, 3],
    ['one job', { branches: 1, cohorts: 1, groups: 1 }, 4],
    ['24 branches over 14 half-years', { branches: 24, cohorts: 14, groups: 4 }, 14],
    ['15 years', { branches: 2, cohorts: 30 }, 8],
    [
      'names that no font draws',
      { firstName: '青空'.repeat(60), network: '青', currency: 'AMD' },
      6,
    ],
  ])('given %s, prints whole pages that are tagged', (_, size, atLeast) => {
    const pdf = printReport(sampleReport(size));
    expect(pdf.subarray(0, 8).toString()).toBe('%PDF-1.7');
    expect(pagesOf(pdf)).toBeGreaterThanOrEqual(atLeast);
    const text = pdf.toString('latin1');
    expect(text).toContain('/Marked true');
    expect(text).toContain('/Lang (en-GB)');
    expect(text).toContain('/S /TH');
    expect(text).not.toContain('Helvetica');
  });
});

describe('namesOf', () => {
  it('given a name with a character that no font file has, tells the code instead', () => {
    const fonts = new Fonts(new PDFDocument({ font: '' }));
    const names = namesOf(sampleReport({ firstName: '青空', network: '青' }), fonts);
    expect([names.branch('B00'), names.network]).toEqual(['B00', 'The network']);
    expect(names.branch('B01')).toBe('Branch of B01');
    const drawn = namesOf(sampleReport({ firstName: 'Žďárská Łódź Øvre' }), fonts);
    expect(drawn.branch('B00')).toBe('Žďárská Łódź Øvre');
  });
});
