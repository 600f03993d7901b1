import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import type { Fonts } from './fonts';

/** What can be drawn of the names in a report: a name with a character that no font file has is told by its code. */
export interface Names {
  network: string;
  branch: (code: string) => string;
}

/** The names of a report as they can be printed. */
export function namesOf(report: WarrantyReport, fonts: Fonts): Names {
  const byCode = new Map(
    report.branches.map(({ code, name }) => {
      const told = name.normalize('NFC').trim();
      return [code, told !== '' && fonts.canDraw(told) ? told : code];
    }),
  );
  const network = report.network.normalize('NFC').trim();
  return {
    network: network !== '' && fonts.canDraw(network) ? network : 'The network',
    branch: (code) => byCode.get(code) ?? code,
  };
}
