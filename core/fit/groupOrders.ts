/** More orders than this are not tried: the first ones mix the analytes most evenly. */
const mostOrders = 20;

/**
 * All orders in which the groups of several analytes may lose their protons,
 * each analyte's own groups staying in order. Each order lists the analyte
 * of every group in turn: [0, 0, 1] is both groups of the first, then the second's.
 */
export function groupOrders(groups: readonly number[]): number[][] {
  const orders: number[][] = [];
  const left = [...groups];
  const order: number[] = [];
  const extend = () => {
    if (orders.length >= mostOrders) return;
    if (left.every((count) => count === 0)) {
      orders.push([...order]);
      return;
    }
    for (let a = 0; a < left.length; a++) {
      if (left[a] === 0) continue;
      left[a]--;
      order.push(a);
      extend();
      order.pop();
      left[a]++;
    }
  };
  extend();
  return orders;
}
