// Characters that LaTeX writes as control sequences: accents, letters, marks.

/** Accents by their control sequence, as combining characters of Unicode. */
const ACCENTS: Readonly<Record<string, string>> = {
  '`': '\u0300',
  "'": '\u0301',
  '^': '\u0302',
  '~': '\u0303',
  '"': '\u0308',
  '=': '\u0304',
  '.': '\u0307',
  u: '\u0306',
  v: '\u030C',
  H: '\u030B',
  c: '\u0327',
  d: '\u0323',
  b: '\u0331',
  r: '\u030A',
  k: '\u0328',
  t: '\u0361',
};

/** What else stands for characters. Those for white space are no-break, as lines do not end there. */
const SYMBOLS: Readonly<Record<string, string>> = {
  ...{ '%': '%', '&': '&', _: '_', '#': '#', $: '$', '{': '{', '}': '}', ',': '\u00A0', ';': '\u00A0', ':': '\u00A0' },
  ...{ ss: 'ß', SS: 'SS', ae: 'æ', AE: 'Æ', oe: 'œ', OE: 'Œ', o: 'ø', O: 'Ø', aa: 'å', AA: 'Å', l: 'ł', L: 'Ł' },
  ...{ i: 'ı', j: 'ȷ', dh: 'ð', DH: 'Ð', th: 'þ', TH: 'Þ', dj: 'đ', DJ: 'Đ', ng: 'ŋ', NG: 'Ŋ' },
  ...{ S: '§', P: '¶', pounds: '£', textsterling: '£', euro: '€', texteuro: '€', textyen: '¥', textcent: '¢' },
  ...{ copyright: '©', textcopyright: '©', textregistered: '®', texttrademark: '™', textdegree: '°', degree: '°' },
  ...{ dots: '…', ldots: '…', textellipsis: '…', textendash: '–', textemdash: '—', textbullet: '•' },
  ...{ textquoteleft: '‘', textquoteright: '’', textquotedblleft: '“', textquotedblright: '”', quotedblbase: '„' },
  ...{ guillemotleft: '«', guillemotright: '»', guillemetleft: '«', guillemetright: '»', glqq: '„', grqq: '“' },
  ...{ flqq: '«', frqq: '»', og: '«', fg: '»', lq: '‘', rq: '’', glq: '‚', grq: '‘', textquotesingle: "'" },
  ...{ textquotedbl: '"', dq: '"', quotesinglbase: '‚', textasciitilde: '~', textasciicircum: '^' },
  ...{ textbackslash: '\\', textbar: '|', textless: '<', textgreater: '>', textunderscore: '_', textdollar: '$' },
  ...{ textbraceleft: '{', textbraceright: '}', lbrace: '{', rbrace: '}', textperiodcentered: '·', slash: '/' },
  ...{ textmu: 'µ', texttimes: '×', textdiv: '÷', textpm: '±', textparagraph: '¶', textsection: '§', textonehalf: '½' },
  ...{ textonequarter: '¼', textrightarrow: '→', textleftarrow: '←', textexclamdown: '¡', textquestiondown: '¿' },
  ...{ textordfeminine: 'ª', textordmasculine: 'º', dag: '†', ddag: '‡', textdagger: '†', textnumero: '№' },
  ...{ thinspace: '\u00A0', nobreakspace: '\u00A0', negthinspace: '', TeX: 'TeX', LaTeX: 'LaTeX', LaTeXe: 'LaTeX2e' },
  ...{
    BibTeX: 'BibTeX',
    XeTeX: 'XeTeX',
    LuaTeX: 'LuaTeX',
    XeLaTeX: 'XeLaTeX',
    LuaLaTeX: 'LuaLaTeX',
    pdfLaTeX: 'pdfLaTeX',
  },
  ...{ nobreakdash: '', textvisiblespace: '␣', checkmark: '✓' },
  ...{ sphinxhyphen: '-', PYGZus: '_', PYGZhy: '-', textcompwordmark: '' },
};

/** Shorthands that babel gives a quotation mark in German; an empty text vanishes. */
const GERMAN: Readonly<Record<string, string>> = {
  ...{ a: 'ä', o: 'ö', u: 'ü', A: 'Ä', O: 'Ö', U: 'Ü', s: 'ß', z: 'ß', e: 'ë', i: 'ï' },
  ...{ '`': '„', "'": '“', '<': '«', '>': '»', '-': '', '~': '-', '=': '-', '|': '', '"': '', '/': '/' },
};

/** The text that a control sequence alone stands for, or undefined. */
export function symbolOf(name: string): string | undefined {
  return Object.hasOwn(SYMBOLS, name) ? SYMBOLS[name] : undefined;
}

/** The combining character of an accent's control sequence, or undefined. */
export function accentOf(name: string): string | undefined {
  return Object.hasOwn(ACCENTS, name) ? ACCENTS[name] : undefined;
}

/** The text of a German shorthand by what follows its quotation mark, or undefined. */
export function germanShorthand(unit: string): string | undefined {
  return Object.hasOwn(GERMAN, unit) ? GERMAN[unit] : undefined;
}

const ACCENTED =
  /[ \t]*(?:\{[ \t]*(?:\\([ij])(?![A-Za-z])[ \t]*|([^\\{}\s]))?[ \t]*\}|\\([ij])(?![A-Za-z])[ \t]?|([^\\{}\s%$&#~]))/y;

/** The letter under an accent that begins behind its control sequence at `at`: the text of both, and where it ends. */
export function accented(text: string, at: number, accent: string): { text: string; end: number } | undefined {
  ACCENTED.lastIndex = at;
  const found = ACCENTED.exec(text);
  if (!found) return undefined;
  let letter = found[1] ?? found[3] ?? found[2] ?? found[4];
  if (letter === undefined) return undefined;
  let end = at + found[0].length;
  const unit = letter.charCodeAt(0);
  if (unit >= 0xd800 && unit < 0xe000) {
    const pair = text.charCodeAt(end);
    // At the text's end there is no second half, and its code is not a number.
    if (found[4] === undefined || unit >= 0xdc00 || !(pair >= 0xdc00 && pair < 0xe000)) return undefined;
    letter += text[end++]!;
  }
  return { text: (letter + accent).normalize('NFC'), end };
}
