/** A count as it is read: "1,000". */
export function withThousands(count: number): string {
  return count.toLocaleString('en-GB');
}
