/**
 * Places for labels that would otherwise stand on each other: as near as can be to where they belong, at least `gap`
 * apart, in the same order. Labels that crowd share the shift.
 */
export function apart(wanted: readonly number[], gap: number): number[] {
  const order = wanted.map((at, index) => ({ at, index })).sort((a, b) => a.at - b.at);
  // Clusters of crowded labels, each centred on the mean of where its labels belong.
  const clusters: { first: number; count: number; sum: number }[] = [];
  order.forEach(({ at }, first) => {
    clusters.push({ first, count: 1, sum: at });
    for (;;) {
      const [above, below] = [clusters.at(-2), clusters.at(-1)];
      if (!above || !below || topOf(below, gap) - bottomOf(above, gap) >= gap) break;
      clusters.splice(-2, 2, { first: above.first, count: above.count + below.count, sum: above.sum + below.sum });
    }
  });
  const placed = wanted.slice();
  for (const cluster of clusters)
    order.slice(cluster.first, cluster.first + cluster.count).forEach(({ index }, i) => {
      placed[index] = topOf(cluster, gap) + i * gap;
    });
  return placed;
}

type Cluster = { count: number; sum: number };
const topOf = ({ count, sum }: Cluster, gap: number) => sum / count - ((count - 1) * gap) / 2;
const bottomOf = ({ count, sum }: Cluster, gap: number) => sum / count + ((count - 1) * gap) / 2;
