export type Hazard =
  | 'hot'
  | 'pressure'
  | 'moving'
  | 'chemicals'
  | 'electricity'
  | 'dust'
  | 'lifting'
  | 'noise'
  | 'other';

/** What stands in the triangle, on a 48 x 48 grid; between x 16 to 32, y 19 to 39; shown a fifth larger. */
const drawings: Readonly<Record<Hazard, string>> = {
  hot: 'M16 38h16M18.5 33.5c-2-2.2 2-3.8 0-6.5m5.5 6.5c-2-2.2 2-3.8 0-6.5m5.5 6.5c-2-2.2 2-3.8 0-6.5',
  pressure: 'M18.2 37.5a7.5 7.5 0 1 1 11.6 0M24 33l3.6-4.6M16 37.5h16',
  moving: 'M19.3 38.5a4 4 0 1 0 0-8 4 4 0 0 0 0 8Zm9.4 0a4 4 0 1 0 0-8 4 4 0 0 0 0 8ZM24 19v8.5m-3-3 3 3 3-3',
  chemicals:
    'M24 20c3 3.9 4.5 6.3 4.5 8.5a4.5 4.5 0 0 1-9 0c0-2.2 1.5-4.6 4.5-8.5ZM16 38.5c2.7-1.8 5.3-1.8 8 0s5.3 1.8 8 0',
  electricity: 'm26 18.5-6 11h8l-5 10',
  dust: 'M16 38c2.7-1.8 5.3 1.8 8 0s5.3 1.8 8 0m-13-5.5c1.7-1.2 3.3 1.2 5 0s3.3 1.2 5 0M24 27h.01M21 22.5h.01M27 23h.01',
  lifting: 'M18 31.5h12v7H18ZM24 28.5v-9m-3.5 3.5 3.5-3.5 3.5 3.5',
  noise: 'M16.5 30v5h3l4.5 4V26l-4.5 4Zm11-.5c1.4 1.7 1.4 4.3 0 6m3-8.5c2.7 3.2 2.7 7.8 0 11',
  other: 'M24 20v10.5m0 6h.01',
};

interface HazardSignProps {
  readonly hazard: Hazard;
  readonly size?: number | undefined;
}

/** The warning triangle with the usual meaning inside. Never without its word beside it. */
export function HazardSign({ hazard, size = 36 }: HazardSignProps) {
  return (
    <svg
      className="icon hazard-sign"
      width={size}
      height={size}
      viewBox="0 0 48 48"
      fill="none"
      stroke="currentColor"
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
      focusable="false"
    >
      <path d="M24 4.5 46 43.5H2Z" strokeWidth={3} className="hazard-sign-plate" />
      <path d={drawings[hazard]} strokeWidth={2} transform="translate(24 33) scale(1.2) translate(-24 -33)" />
    </svg>
  );
}
