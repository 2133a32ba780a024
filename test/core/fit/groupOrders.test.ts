import { describe, expect, it } from 'vitest';
import { groupOrders } from '../../../core/fit/groupOrders.ts';

describe('orders in which groups lose their protons', () => {
  it('is one for one analyte', () => {
    expect(groupOrders([3])).toEqual([[0, 0, 0]]);
  });

  it('are all ways to mix two analytes', () => {
    expect(groupOrders([2, 1]).map(String).sort()).toEqual(['0,0,1', '0,1,0', '1,0,0']);
    expect(groupOrders([1, 1])).toHaveLength(2);
  });

  it('are limited, each whole and each once', () => {
    const orders = groupOrders([3, 3, 3]);
    expect(orders.length).toBeGreaterThan(1);
    expect(orders.length).toBeLessThanOrEqual(20);
    expect(new Set(orders.map(String)).size).toBe(orders.length);
    for (const order of orders) expect([...order].sort()).toEqual([0, 0, 0, 1, 1, 1, 2, 2, 2]);
  });

  it('of nothing is one empty order', () => {
    expect(groupOrders([])).toEqual([[]]);
  });
});
