// The sum of numbers of one unit. Source: none needed.

export function total(numbers: readonly number[]): number {
  return numbers.reduce((sum, one) => sum + one, 0);
}
