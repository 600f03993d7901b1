import type { ReadRow, RowProblem } from './read-row';

/** What a row makes of the stored job or claim: a body as the API would be sent, and where in it each cell went. */
export class RowBody {
  readonly body: Record<string, unknown>;
  /** JSON pointer → what a column fills. */
  readonly places = new Map<string, string>();
  readonly problems: RowProblem[] = [];

  constructor(
    readonly row: ReadRow,
    stored: object | undefined,
  ) {
    this.body = { ...stored };
  }

  /** Fills fields of the body itself. */
  fill(...keys: readonly string[]): void {
    for (const key of keys) this.put(this.body, '', key, key);
  }

  /** Fills fields of a part of the body; without any filled one the part is absent. */
  fillPart(part: string, keys: readonly string[]): Record<string, unknown> | undefined {
    const fields = keys.map((key) => `${part}.${key}`);
    if (!fields.some((fills) => this.row.has(fills))) return this.part(part);
    const filled = { ...this.part(part) };
    for (const key of keys) this.put(filled, `/${part}`, key, `${part}.${key}`);
    const some = Object.keys(filled).length > 0;
    if (some) this.body[part] = filled;
    else delete this.body[part];
    return some ? filled : undefined;
  }

  /** Fills one field of an object that stands at a pointer. An empty cell takes it away; no column leaves it. */
  put(into: Record<string, unknown>, at: string, key: string, fills: string): void {
    this.places.set(`${at}/${key}`, fills);
    if (!this.row.has(fills)) return;
    const value = this.row.value(fills);
    if (value === undefined) delete into[key];
    else into[key] = value;
  }

  private part(name: string): Record<string, unknown> | undefined {
    return this.body[name] as Record<string, unknown> | undefined;
  }
}
