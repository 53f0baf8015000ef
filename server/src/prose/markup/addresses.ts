// Finds what stands in a text and is no prose: URLs, e-mail addresses, markers that a generator fills in, tags that are shown.

/** A stretch `[start, end)` of the text. */
interface Found {
  readonly start: number;
  readonly end: number;
}

const LONGEST_SCHEME = 20;
const LONGEST_LOCAL_PART = 100;
const LONGEST_MARKER = 600;
const SCHEME_UNIT = /[A-Za-z0-9+.-]/;
const LOCAL_UNIT = /[A-Za-z0-9_+.-]/;
const DOMAIN = /[A-Za-z0-9-]{1,63}(?:\.[A-Za-z0-9-]{1,63}){1,10}/y;
const SHOWN_TAG = /&lt;\/?[A-Za-z][\w:.-]{0,80}\s?\/?&gt;/y;
const URL_REST = /(?:&amp;|[^\s<>"'`|\\^{}&])*/y;
const TRAILING = '.,;:!?)]\u2019\u201D*';

type Finder = (text: string, mark: number, from: number) => Found | undefined;

const FINDERS: readonly (readonly [string, Finder])[] = [
  ['://', withScheme],
  ['www.', withoutScheme],
  ['@', mailAddress],
  ['{{', (text, mark) => marker(text, mark, '}}')],
  ['{%', (text, mark) => marker(text, mark, '%}')],
  ['<%', (text, mark) => marker(text, mark, '%>')],
  ['${', (text, mark) => marker(text, mark, '}')],
  ['&lt;', shownTag],
];

/** Steps through a text from left to right. */
export class AddressFinder {
  /** Where the next mark of each finder stands; behind the text where there is none. */
  private readonly marks: number[] = FINDERS.map(() => -1);
  /** What was found at a mark, so that a long address is measured once. */
  private readonly found: (Found | undefined)[] = FINDERS.map(() => undefined);

  constructor(private readonly text: string) {}

  /** The first address that lies in `[from, to)`, or undefined. `from` must not be less than in the call before. */
  next(from: number, to: number): Found | undefined {
    let first: Found | undefined;
    for (let i = 0; i < FINDERS.length; i++) {
      const [sign, find] = FINDERS[i]!;
      for (;;) {
        let mark = this.marks[i]!;
        if (mark < from) mark = this.moveTo(i, sign, from);
        if (mark >= to || (first !== undefined && mark >= first.end)) break;
        let found = this.found[i];
        if (found === undefined || found.start < from) this.found[i] = found = find(this.text, mark, from);
        if (found !== undefined && found.end <= to) {
          if (first === undefined || found.start < first.start) first = found;
          break;
        }
        this.moveTo(i, sign, mark + 1);
      }
    }
    return first;
  }

  private moveTo(i: number, sign: string, from: number): number {
    const mark = this.text.indexOf(sign, from);
    this.found[i] = undefined;
    return (this.marks[i] = mark < 0 ? this.text.length : mark);
  }
}

function withScheme(text: string, mark: number, from: number): Found | undefined {
  let start = mark;
  while (start > from && mark - start < LONGEST_SCHEME && SCHEME_UNIT.test(text[start - 1]!)) start--;
  const end = urlEnd(text, mark + 3);
  return start < mark && end > mark + 3 ? { start, end } : undefined;
}

function withoutScheme(text: string, mark: number, from: number): Found | undefined {
  if (mark > from && /[\w./-]/.test(text[mark - 1]!)) return undefined;
  const end = urlEnd(text, mark + 4);
  return end > mark + 4 ? { start: mark, end } : undefined;
}

function urlEnd(text: string, from: number): number {
  URL_REST.lastIndex = from;
  URL_REST.exec(text);
  let end = URL_REST.lastIndex;
  while (end > from && TRAILING.includes(text[end - 1]!)) end--;
  return end;
}

function mailAddress(text: string, mark: number, from: number): Found | undefined {
  let start = mark;
  while (start > from && mark - start < LONGEST_LOCAL_PART && LOCAL_UNIT.test(text[start - 1]!)) start--;
  if (start === mark) return undefined;
  DOMAIN.lastIndex = mark + 1;
  return DOMAIN.test(text) ? { start, end: DOMAIN.lastIndex } : undefined;
}

function shownTag(text: string, mark: number): Found | undefined {
  SHOWN_TAG.lastIndex = mark;
  return SHOWN_TAG.test(text) ? { start: mark, end: SHOWN_TAG.lastIndex } : undefined;
}

function marker(text: string, mark: number, closing: string): Found | undefined {
  const window = text.slice(mark + 2, mark + LONGEST_MARKER);
  const at = window.indexOf(closing);
  return at < 0 ? undefined : { start: mark, end: mark + 2 + at + closing.length };
}
