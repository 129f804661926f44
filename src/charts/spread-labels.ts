/**
 * Moves labels apart so that none covers another, each as near to its place as can be.
 * @param places wanted middles in pixels, in any order
 * @param gap least distance between two middles, in pixels
 * @param bounds the middles stay within, in pixels, unless they do not fit
 * @returns the middles, in the order of `places`
 * @example spreadLabels([10, 12], 10, { top: 0, bottom: 100 }) // [6, 16]
 */
export function spreadLabels(
  places: readonly number[],
  gap: number,
  { top, bottom }: { readonly top: number; readonly bottom: number },
): readonly number[] {
  const order = places.map((wanted, index) => ({ wanted, index })).sort((a, b) => a.wanted - b.wanted);
  // Labels that touch form a block, which stands where its members want to stand on average.
  const blocks: { middle: number; members: number[] }[] = [];
  for (const { wanted, index } of order) {
    let block = { middle: wanted, members: [index] };
    for (let above = blocks.at(-1); above && touches(above, block, gap); above = blocks.at(-1)) {
      blocks.pop();
      block = join(above, block);
    }
    blocks.push(block);
  }
  const placed = places.slice();
  for (const { middle, members } of blocks) {
    const half = ((members.length - 1) * gap) / 2;
    const kept = Math.max(Math.min(middle, bottom - half), top + half);
    members.forEach((index, rank) => (placed[index] = kept - half + rank * gap));
  }
  return placed;
}

interface Block {
  readonly middle: number;
  readonly members: number[];
}

function touches(above: Block, below: Block, gap: number): boolean {
  return below.middle - above.middle < ((above.members.length + below.members.length) * gap) / 2;
}

function join(above: Block, below: Block): Block {
  const [a, b] = [above.members.length, below.members.length];
  return {
    middle: (above.middle * a + below.middle * b) / (a + b),
    members: [...above.members, ...below.members],
  };
}
