/** @throws RangeError that names the value and what it was */
export function requireRange(name: string, value: number, isInside: boolean): void {
  if (!Number.isFinite(value) || !isInside) throw new RangeError(`${name} out of range: ${value}`);
}
