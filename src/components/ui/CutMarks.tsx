/** Where the scissors go: a short line either way from each corner of a printed tag's cell. */
export function CutMarks() {
  return (
    <svg
      className="cut-marks"
      width="100%"
      height="100%"
      stroke="currentColor"
      aria-hidden="true"
      focusable="false"
    >
      <line x1="0" y1="0" x2="12" y2="0" />
      <line x1="0" y1="0" x2="0" y2="12" />
      <line x1="100%" y1="0" x2="100%" y2="12" />
      <line x1="0" y1="100%" x2="12" y2="100%" />
      <svg x="100%" className="track-anchor" aria-hidden="true">
        <line x1="-12" y1="0" x2="0" y2="0" />
      </svg>
      <svg y="100%" className="track-anchor" aria-hidden="true">
        <line x1="0" y1="-12" x2="0" y2="0" />
      </svg>
      <svg x="100%" y="100%" className="track-anchor" aria-hidden="true">
        <line x1="-12" y1="0" x2="0" y2="0" />
        <line x1="0" y1="-12" x2="0" y2="0" />
      </svg>
    </svg>
  );
}
