import type { WarrantyAnswer } from '#shared/contracts/warranty';
import type { Column } from '../../ui/data-table/column';
import { currencySign, formatAmount, formatCount, formatCounted } from '../../ui/format';
import { CLAIM_CAUSE_NAMES, ZONE_NAMES } from '../../ui/words';
import type { WarrantyLinks } from './warranty-links';
import type { WarrantyWords } from './warranty-words';

/** Claims of one zone or cause. */
export interface PlacedRow {
  readonly key: string;
  readonly name: string;
  readonly claims: number;
  readonly costCents: number;
}

/** Where claims sit, or why they came: most claims first. */
export interface PlacedTable {
  readonly columns: readonly Column<PlacedRow>[];
  readonly rows: readonly PlacedRow[];
}

/** Claims by zone of the car. */
export function zoneTable(
  { zones }: WarrantyAnswer,
  words: WarrantyWords,
  links: WarrantyLinks,
): PlacedTable {
  return placedTable(
    'zone',
    zones.map(({ zone, ...more }) => ({ ...more, key: zone, name: ZONE_NAMES[zone] })),
    words,
    links,
  );
}

/** Claims by their cause. */
export function causeTable(
  { causes }: WarrantyAnswer,
  words: WarrantyWords,
  links: WarrantyLinks,
): PlacedTable {
  return placedTable(
    'cause',
    causes.map(({ cause, ...more }) => ({ ...more, key: cause, name: CLAIM_CAUSE_NAMES[cause] })),
    words,
    links,
  );
}

function placedTable(
  by: 'zone' | 'cause',
  all: readonly PlacedRow[],
  words: WarrantyWords,
  links: WarrantyLinks,
): PlacedTable {
  const rows = all
    .filter(({ claims }) => claims > 0)
    .sort((a, b) => b.claims - a.claims || b.costCents - a.costCents);
  const sum = (of: 'claims' | 'costCents'): number =>
    rows.reduce((total, row) => total + row[of], 0);
  return {
    rows,
    columns: [
      {
        key: 'name',
        label: by === 'zone' ? 'Zone' : 'Cause',
        text: ({ name }) => name,
        sortBy: ({ name }) => name,
        total: formatCounted(rows.length, by, `${by}s`),
      },
      {
        key: 'claims',
        label: 'Claims',
        kind: 'number',
        strong: true,
        text: ({ claims }) => formatCount(claims),
        link: ({ key }) => links.claims({ [by]: key }),
        sortBy: ({ claims }) => claims,
        total: formatCount(sum('claims')),
      },
      {
        key: 'bar',
        label: 'Claims, drawn',
        unseenLabel: true,
        text: () => '',
        bar: ({ claims }) => claims,
        total: '',
      },
      {
        key: 'cost',
        label: `Cost, ${currencySign(words.currency)}`,
        kind: 'number',
        text: ({ costCents }) => formatAmount(costCents),
        sortBy: ({ costCents }) => costCents,
        total: formatAmount(sum('costCents')),
      },
    ],
  };
}
