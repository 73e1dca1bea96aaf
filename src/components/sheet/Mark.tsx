/** The step's hexagon with its number: a bolt head seen from above. */
export const Mark = ({ number }: { number: number }) => (
  <svg width="50" height="50" viewBox="0 0 54 54" aria-hidden="true" className="block">
    <path d="M27 7 44.3 17v20L27 47 9.7 37V17z" fill="#fff" stroke="currentColor" strokeWidth="1.7" />
    <text x="27" y="33.7" textAnchor="middle" fontWeight="600" fontSize={number > 99 ? 15 : 19} fill="currentColor">
      {number}
    </text>
  </svg>
);
