// The import table of the server's rooms: what each may import from the others, and from outside.

/** One room: the rooms whose values it may import, those of which types alone, and the packages. */
export interface RoomRule {
  readonly rooms: readonly string[];
  readonly types?: readonly string[];
  readonly packages?: readonly RegExp[];
}

const upToRewrite = [
  'base',
  'text',
  'prose',
  'tokens',
  'lexicon',
  'facts',
  'corpus',
  'mining',
  'termbase',
  'decisions',
].concat(['findings', 'rewrite']);

export const ROOMS: Readonly<Record<string, RoomRule>> = {
  base: { rooms: [] },
  text: { rooms: ['base'] },
  prose: {
    rooms: ['base', 'text'],
    packages: [/^@lezer\//, /^yaml$/, /^character-entities$/, /^htmlparser2$/, /^jsonc-parser$/],
  },
  tokens: { rooms: ['base', 'text', 'prose'], packages: [/^wink-/] },
  lexicon: { rooms: ['base'], packages: [/^franc$/, /^stopword$/] },
  facts: { rooms: ['base', 'text', 'prose', 'tokens', 'lexicon'] },
  corpus: { rooms: ['base', 'text', 'prose', 'tokens', 'facts'] },
  mining: { rooms: ['base', 'prose', 'tokens', 'facts', 'corpus', 'lexicon'] },
  termbase: { rooms: ['base', 'text'], packages: [/^yaml$/] },
  decisions: { rooms: ['base', 'text', 'corpus', 'mining', 'termbase'] },
  findings: {
    rooms: ['base', 'text', 'prose', 'tokens', 'lexicon', 'facts', 'corpus', 'termbase', 'decisions', 'rewrite'],
  },
  rewrite: { rooms: ['base', 'text', 'prose', 'tokens', 'lexicon'] },
  revisions: { rooms: ['base', 'text', 'prose', 'tokens', 'lexicon'], types: ['mining'] },
  engine: { rooms: upToRewrite },
  report: { rooms: ['base', 'engine', 'rewrite'], types: upToRewrite },
  ide: { rooms: ['base', 'text', 'engine', 'rewrite', 'decisions'], types: upToRewrite },
  lsp: { rooms: ['base', 'text', 'engine', 'ide', 'report'], types: upToRewrite, packages: [/^vscode-languageserver/] },
  cli: { rooms: ['base', 'text', 'engine', 'ide', 'report'], types: upToRewrite },
  node: {
    rooms: ['base', 'text', 'engine', 'revisions', 'lsp', 'cli'],
    types: upToRewrite,
    packages: [/^node:/, /^ignore$/, /^picomatch$/, /^chardet$/, /^iconv-lite$/, /^vscode-languageserver/],
  },
};

/** The most lines that a file of code may have; data files are exempt. */
export const LONGEST_FILE = 500;

/** The most lines that the median file may have. */
export const MEDIAN_FILE = 150;

/** Rooms that do no I/O and read no clock, randomness or locale. */
export const PURE_ROOMS = Object.keys(ROOMS).filter((room) => !['lsp', 'cli', 'node'].includes(room));
