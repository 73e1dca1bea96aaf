/** Three strokes cut by a line: the matchmark. */
export const Logo = ({ size = 28 }: { size?: number }) => (
  <svg width={size} height={size} viewBox="0 0 28 28" aria-hidden="true" className="shrink-0">
    <path d="M6 3v9.5M6 15.5V25M22 3v9.5M22 15.5V25" stroke="#14191b" strokeWidth="3.4" />
    <path d="M14 3v9.5M14 15.5V25" stroke="#0b5560" strokeWidth="3.4" />
    <path d="M1 14h26" stroke="#14191b" strokeWidth="1.3" />
  </svg>
);
