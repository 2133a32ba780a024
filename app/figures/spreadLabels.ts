/** Where a label would like its centre, and the room it takes along the line. */
export interface WantedLabel {
  readonly at: number;
  readonly length: number;
}

/**
 * Places labels along a line so that none overlaps another, each as near to
 * where it wants to be as its neighbours allow (least squares of the shifts).
 *
 * @param low least coordinate a label may reach
 * @param high greatest coordinate; where the labels do not fit between, they run over it
 * @returns the centres, in the order of the input
 */
export function spreadLabels(wanted: readonly WantedLabel[], low: number, high: number): number[] {
  const order = wanted.map((_, index) => index).sort((a, b) => wanted[a].at - wanted[b].at || a - b);
  const blocks: Block[] = [];
  for (const index of order) {
    const { at, length } = wanted[index];
    let block: Block = { members: [index], starts: [at - length / 2], length };
    let previous = blocks.at(-1);
    while (previous !== undefined && startOf(previous, low, high) + previous.length > startOf(block, low, high)) {
      const offset = previous.length;
      block = {
        members: [...previous.members, ...block.members],
        starts: [...previous.starts, ...block.starts.map((start) => start - offset)],
        length: offset + block.length,
      };
      blocks.pop();
      previous = blocks.at(-1);
    }
    blocks.push(block);
  }
  const centres = new Array<number>(wanted.length).fill(0);
  for (const block of blocks) {
    let edge = startOf(block, low, high);
    for (const member of block.members) {
      centres[member] = edge + wanted[member].length / 2;
      edge += wanted[member].length;
    }
  }
  return centres;
}

/** Labels that touch: where the block would have to start to please each of them, and its whole length. */
interface Block {
  readonly members: readonly number[];
  readonly starts: readonly number[];
  readonly length: number;
}

function startOf(block: Block, low: number, high: number): number {
  const mean = block.starts.reduce((sum, start) => sum + start, 0) / block.starts.length;
  return Math.max(low, Math.min(mean, high - block.length));
}
