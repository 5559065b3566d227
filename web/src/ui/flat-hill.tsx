/** The hill line at rest, 120 wide, above an empty place. */
export const FlatHill = () => (
  <svg aria-hidden="true" viewBox="0 0 120 22" width={120} height={22}>
    <path
      d="M2 17 L34 17 C50 17 52 7 66 7 C76 7 76 17 94 17 L118 17"
      fill="none"
      stroke="var(--tarn)"
      strokeWidth={1.75}
      strokeLinecap="round"
    />
  </svg>
);
