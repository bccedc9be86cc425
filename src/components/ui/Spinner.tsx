/** A ring with a gap. It turns, or stands still for readers who asked for no motion; the word beside it says what goes on. */
export function Spinner() {
  return (
    <svg
      className="icon spinner"
      width={24}
      height={24}
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth={2}
      strokeLinecap="round"
      aria-hidden="true"
      focusable="false"
    >
      <path d="M12 4a8 8 0 1 1-7.4 5" />
    </svg>
  );
}
