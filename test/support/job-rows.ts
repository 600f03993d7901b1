/** A file of so many jobs that pass, their references beginning alike. */
export function jobRows(rows: number, prefix: string, minutes = 10): string {
  const lines = [
    'job,make,model,body,registered,package,completed,strip,apply,product CW1 ml,price,notes',
  ];
  for (let n = 0; n < rows; n += 1) {
    lines.push(
      `${prefix}-${n},Velder,Tessock,van,2010-01,full,2026-01-28,${minutes},${n % 500},4000,${n % 1000}.05,row ${n}`,
    );
  }
  return `${lines.join('\n')}\n`;
}
