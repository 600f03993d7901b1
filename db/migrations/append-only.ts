/** A trigger that lets no row of a table be changed or removed. */
export function appendOnly(table: string, change: 'update' | 'delete'): string {
  return `create trigger ${table}_no_${change} before ${change} on ${table}
    begin select raise(abort, '${table} is append-only'); end`;
}

/** `replace into` removes a row without the triggers of removal, so a key that is there already is refused as such. */
export function neverReplaced(table: string, ...key: string[]): string {
  const same = key.map((column) => `${column} = new.${column}`).join(' and ');
  return `create trigger ${table}_no_replace before insert on ${table}
    when exists (select 1 from ${table} where ${same})
    begin select raise(abort, '${table} is append-only'); end`;
}
