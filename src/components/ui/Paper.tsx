/**
 * The paper of a job tag, of any size: fills its positioned parent with a white sheet, ink edge, clipped top right corner
 * and punched hole. Drawn in SVG so that it prints and survives forced colors, where backgrounds are left out.
 */
export function Paper() {
  return (
    <span className="paper" aria-hidden="true">
      <span className="paper-sheet" />
      <svg
        className="paper-clip"
        width={17}
        height={17}
        viewBox="0 0 17 17"
        aria-hidden="true"
        focusable="false"
      >
        <path d="M0 .5 16.5 17" fill="none" stroke="currentColor" className="paper-clip-edge" />
      </svg>
      <svg
        className="paper-hole"
        width={11}
        height={11}
        viewBox="0 0 11 11"
        aria-hidden="true"
        focusable="false"
      >
        <circle cx={5.5} cy={5.5} r={4.5} stroke="currentColor" />
      </svg>
    </span>
  );
}
