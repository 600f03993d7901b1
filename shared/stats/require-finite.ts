/** Returns the value, or throws: NaN and infinities are arguments that no method here can mean. */
export function requireFinite(value: number | undefined, name: string): number {
  if (value === undefined || !Number.isFinite(value)) {
    throw new RangeError(`${name} must be a finite number, got ${value}`);
  }
  return value;
}
