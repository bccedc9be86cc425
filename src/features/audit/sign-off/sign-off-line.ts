/** One line to be looked at by whoever signs off. */
export interface SignOffLine {
  /** JSON pointer into what is reviewed. */
  readonly place: string;
  readonly label: string;
  readonly words: string;
  /** Where its figures stand; null for what somebody decided. */
  readonly href: string | null;
}

export interface SignOffPart {
  readonly title: string;
  readonly lines: readonly SignOffLine[];
}
