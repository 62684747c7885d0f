/** The mark: a core with one heavy loop of cable through its bore and round the outside. */
export function Mark({ size = 40 }: { readonly size?: number }) {
  return (
    <svg viewBox="-42 -42 104 84" width={size} height={size * 0.81} aria-hidden="true">
      <path d="M6 3 C 4 -14 14 -25 30 -25 C 47 -25 54 -12 52 3" fill="none" stroke="var(--lb-copper)" strokeWidth="9" />
      <path
        d="M0 -38A38 38 0 1 1 0 38A38 38 0 1 1 0 -38Z M-1.69 -18.92L-2.40 -26.89L2.40 -26.89L1.69 -18.92A19 19 0 0 1 8.00 -17.23L11.37 -24.49L15.53 -22.09L10.93 -15.54A19 19 0 0 1 15.54 -10.93L22.09 -15.53L24.49 -11.37L17.23 -8.00A19 19 0 0 1 18.92 -1.69L26.89 -2.40L26.89 2.40L18.92 1.69A19 19 0 0 1 17.23 8.00L24.49 11.37L22.09 15.53L15.54 10.93A19 19 0 0 1 10.93 15.54L15.53 22.09L11.37 24.49L8.00 17.23A19 19 0 0 1 1.69 18.92L2.40 26.89L-2.40 26.89L-1.69 18.92A19 19 0 0 1 -8.00 17.23L-11.37 24.49L-15.53 22.09L-10.93 15.54A19 19 0 0 1 -15.54 10.93L-22.09 15.53L-24.49 11.37L-17.23 8.00A19 19 0 0 1 -18.92 1.69L-26.89 2.40L-26.89 -2.40L-18.92 -1.69A19 19 0 0 1 -17.23 -8.00L-24.49 -11.37L-22.09 -15.53L-15.54 -10.93A19 19 0 0 1 -10.93 -15.54L-15.53 -22.09L-11.37 -24.49L-8.00 -17.23A19 19 0 0 1 -1.69 -18.92Z"
        fill="var(--lb-text)"
        fillRule="evenodd"
      />
      <path d="M5.6 -1 C 6 16 14 27 30 27 C 45 27 53 15 52 -1" fill="none" stroke="var(--lb-ground)" strokeWidth="14" />
      <path d="M5.6 -1 C 6 16 14 27 30 27 C 45 27 53 15 52 -1" fill="none" stroke="var(--lb-copper)" strokeWidth="9" />
    </svg>
  );
}
