// The report's colours by role, for light and dark; a test holds text to the contrast of WCAG 2.2, level AA.

/** Colours by role, as `#rrggbb`. */
export interface Palette {
  readonly page: string;
  readonly panel: string;
  readonly ink: string;
  readonly faint: string;
  readonly line: string;
  readonly link: string;
  /** The leading, and the preferred, name. */
  readonly first: string;
  readonly second: string;
  readonly third: string;
  /** All further names. */
  readonly further: string;
  /** Grounds of highlighted names in sentences. */
  readonly firstGround: string;
  readonly secondGround: string;
  readonly thirdGround: string;
}

export const LIGHT: Palette = {
  page: '#fbfaf6',
  panel: '#ffffff',
  ink: '#20242b',
  faint: '#5a6069',
  line: '#ddd9cf',
  link: '#175a73',
  first: '#1f6f78',
  second: '#b86b1d',
  third: '#7d4a86',
  further: '#7b8087',
  firstGround: '#d9ecec',
  secondGround: '#f8e5cd',
  thirdGround: '#ecdff0',
};

export const DARK: Palette = {
  page: '#16191d',
  panel: '#1d2126',
  ink: '#e7e4dc',
  faint: '#a5abb3',
  line: '#343a41',
  link: '#86c5d8',
  first: '#5cb3b6',
  second: '#e0a055',
  third: '#bd92c8',
  further: '#8d939b',
  firstGround: '#1c4347',
  secondGround: '#54391a',
  thirdGround: '#46304c',
};
