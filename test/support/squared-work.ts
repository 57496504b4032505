// Work that grows with the square of its size, for the test of what counts work.
export function squared(count: number): number {
  let sum = 0;
  for (let one = 0; one < count; one++) {
    for (let other = 0; other < count; other++) sum += one ^ other;
  }
  return sum;
}
