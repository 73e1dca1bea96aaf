export const groups = [
  { title: 'Bolts', fields: ['positions'] },
  { title: 'Order and passes', fields: ['order', 'final', 'passes'] },
] as const;

const CIRCLE = [
  [0, -60],
  [52, -30],
  [52, 30],
  [0, 60],
  [-52, 30],
  [-52, -30],
] as const;

export const example = {
  ...Object.fromEntries(
    CIRCLE.flatMap(([x, y], i) => [
      [`positions.${i}.x`, `${x} mm`],
      [`positions.${i}.y`, `${y} mm`],
    ]),
  ),
  order: '1 4 3 6 5 2',
  final: '22 N·m',
};
