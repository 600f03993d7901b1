import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { formatCount } from '../../../ui/format';
import { CHECK_NAMES } from '../../../ui/words';
import { figureWords, limitsWords } from '../report-words';
import { number, type PaperRows, words } from './paper-rows';

/** What is compared: a check missed against done, or thin product against enough. */
interface Compared {
  readonly name: string;
  readonly risk: WarrantyAnswer['thinProduct'];
}

/** How many times as likely a claim is where a check was missed, pooled over age bands. */
export function processRows(answer: WarrantyAnswer): PaperRows {
  return {
    columns: [
      words('Missed against done'),
      number('Cars missed'),
      number('Missed, with a claim'),
      number('Cars done'),
      number('Done, with a claim'),
      number('Age bands'),
      number('Times as likely'),
      number('95 % interval'),
    ],
    rows: compared(answer).map(({ name, risk }) => [
      name,
      ...totals(risk),
      formatCount(risk.strata),
      figureWords(risk.riskRatio, 2),
      limitsWords(risk.lower, risk.upper, 2),
    ]),
  };
}

/** The same, age band by age band: what the pooled figure is made of. */
export function stratumRows(answer: WarrantyAnswer): PaperRows {
  return {
    columns: [
      words('Missed against done'),
      words('Age, years'),
      number('Cars missed'),
      number('Missed, with a claim'),
      number('Cars done'),
      number('Done, with a claim'),
    ],
    rows: compared(answer).flatMap(({ name, risk }) =>
      risk.tables.map((table) => [
        name,
        table.ageBand.replace('-', '–'),
        formatCount(table.exposedCars),
        formatCount(table.exposedClaims),
        formatCount(table.unexposedCars),
        formatCount(table.unexposedClaims),
      ]),
    ),
  };
}

function compared({ process, thinProduct }: WarrantyAnswer): Compared[] {
  return [
    ...process.map(({ check, ...risk }) => ({ name: CHECK_NAMES[check], risk })),
    { name: 'under 70 % of the product norm', risk: thinProduct },
  ];
}

function totals({ tables }: WarrantyAnswer['thinProduct']): string[] {
  const sum = (count: (table: (typeof tables)[number]) => number): string =>
    formatCount(tables.reduce((all, table) => all + count(table), 0));
  return [
    sum(({ exposedCars }) => exposedCars),
    sum(({ exposedClaims }) => exposedClaims),
    sum(({ unexposedCars }) => unexposedCars),
    sum(({ unexposedClaims }) => unexposedClaims),
  ];
}
