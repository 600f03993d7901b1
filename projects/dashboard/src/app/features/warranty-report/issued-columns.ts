import type { IssuedReport } from '#shared/contracts/warranty-reports';
import type { Column } from '../../ui/data-table/column';
import { formatCount, formatInstant, formatShortDate } from '../../ui/format';
import { figureOf, issuerWords } from './issued-words';

/** The list of issued reports: number, day, when and by whom, what it said. */
export function issuedColumns(currency: string): readonly Column<IssuedReport>[] {
  return [
    {
      key: 'id',
      label: 'Report',
      text: ({ id }) => `Report ${id}`,
      link: ({ id }) => ({ commands: ['/warranty/reports', id] }),
    },
    { key: 'asOf', label: 'As of', text: ({ asOf }) => formatShortDate(asOf) },
    {
      key: 'issued',
      label: 'Issued',
      text: ({ issuedAt }) => formatInstant(issuedAt),
      quiet: ({ by }) => `by ${issuerWords(by)}`,
    },
    {
      key: 'covered',
      label: 'Cars',
      kind: 'number',
      text: ({ covered }) => formatCount(covered),
    },
    { key: 'claims', label: 'Claims', kind: 'number', text: ({ claims }) => formatCount(claims) },
    {
      key: 'figure',
      label: 'Still to come',
      kind: 'number',
      text: (issued) => figureOf(issued, currency),
    },
  ];
}
