/** Six dots: take hold here. */
export const Grip = () => (
  <svg width="9" height="14" viewBox="0 0 9 14" aria-hidden="true" fill="currentColor">
    {[1.5, 7, 12.5].flatMap((y) => [1.5, 7.5].map((x) => <circle key={`${x} ${y}`} cx={x} cy={y} r="1.5" />))}
  </svg>
);
