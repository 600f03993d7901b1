import { LARGEST_FILE } from '#shared/contracts/imports';

/** Why a file need not be sent at all: the server would refuse it; `undefined` when it may be tried. */
export function refusalOf(file: {
  readonly name: string;
  readonly size: number;
}): string | undefined {
  if (/\.(xls[xmb]?|ods|numbers)$/i.test(file.name)) {
    return 'This is a workbook; save it as CSV (UTF-8) and send that.';
  }
  if (file.size > LARGEST_FILE) return 'A file has at most 50 MB.';
  if (file.size === 0) return 'The file is empty.';
  return undefined;
}
