/** Two job tags on a hook with nothing written on them yet. */
export function BlankTag() {
  return (
    <svg
      className="empty-state-drawing"
      width={96}
      height={80}
      viewBox="0 0 96 80"
      fill="none"
      stroke="currentColor"
      strokeWidth={2}
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
      focusable="false"
    >
      <path d="M16 6h64M32 6v8m32-8v8" />
      <path d="M14 14h30l8 8v46a3 3 0 0 1-3 3H14a3 3 0 0 1-3-3V17a3 3 0 0 1 3-3Z" strokeDasharray="5 5" />
      <path d="M58 14h18l8 8v46a3 3 0 0 1-3 3H58" strokeDasharray="5 5" />
      <path d="M32 21.5a2.5 2.5 0 1 0 0 5 2.5 2.5 0 0 0 0-5Zm32 0a2.5 2.5 0 1 0 0 5 2.5 2.5 0 0 0 0-5ZM19 40h14m-14 9h20m-20 9h10" />
    </svg>
  );
}
