// Hostile LaTeX: what would make a parser slow or deep is read in a bounded multiple of the time that prose takes.
import { describe, expect, it } from 'vitest';
import { read } from '../../../server/src/prose/read.js';

const SIZE = 200_000;
/** Reading 200 KB of prose takes about 8 ms; what is quadratic takes seconds. */
const MOST = 30;

function fill(unit: string): string {
  return unit.repeat(Math.ceil(SIZE / unit.length)).slice(0, SIZE);
}

const CLASS = '\\documentclass{a}';
const HOSTILE: Record<string, string> = {
  'one word': fill('a'),
  'opening braces': fill('{'),
  'closing braces': fill('}'),
  'braces and environments': fill('{').slice(0, SIZE / 2) + fill('\\end{a}').slice(0, SIZE / 2),
  environments: fill('\\begin{a}'),
  'environments that do not close': fill('\\begin{a}\\end{b}'),
  'listings without an end': fill('\\begin{verbatim}'),
  'listings of many names': Array.from({ length: 8000 }, (_, i) => `\\begin{code${i}}`).join(''),
  'equations without an end': fill('\\begin{equation}'),
  'formulas without an end': fill('$a\n\n'),
  dollars: fill('$ '),
  'displays without an end': fill('\\['),
  'arguments that are not closed': fill('\\label{'),
  'arguments in arguments': fill('\\emph{'),
  'unknown commands in each other': fill('\\foo{'),
  'unknown commands with prose': fill('\\foo{one two three four '),
  'options that are not closed': fill('\\section['),
  'options of unknown commands': fill('\\foo['),
  footnotes: fill('\\footnote{a '),
  labels: `\\begin{description}${fill('\\item[')}`,
  items: fill('\\item '),
  sections: fill('\\section{a'),
  'definitions without an end': fill('\\newcommand{\\a}[1]{'),
  definitions: fill('\\newcommand{\\a}[9]{#1 \\emph{#2}}'),
  'environments defined': fill('\\newenvironment{a}[1]{\\begin{b}[}{}'),
  'titles in a preamble': CLASS + fill('\\title{a'),
  'titles in a comment': `${CLASS}%${fill('\\title{a}')}`,
  'documents in a comment': `%${fill('\\documentclass')}`,
  'glossary entries in each other': fill('\\newglossaryentry{a}{name={'),
  'glossary entries': fill('\\newglossaryentry{a}{name={b},description={c}}'),
  'captions in options': fill('\\lstset{caption={'),
  comments: fill('%\n'),
  'comments before arguments': `\\emph${fill('%\n')}`,
  blanks: `a${fill(' ')}b`,
  'blank lines': `a${fill('\n \n')}b`,
  backslashes: fill('\\'),
  accents: fill("\\'"),
  'verbatim marks': fill('\\verb|'),
  'short verbatim marks': `\\MakeShortVerb{\\|}${fill('|')}`,
  'listing definitions': fill('\\newtcblisting['),
  'blanks behind a definition': `\\newcommand${fill(' ')}`,
  'blanks behind an environment’s definition': `\\newenvironment${fill(' ')}`,
  'blanks behind a listing’s definition': `\\newtcblisting${fill(' ')}`,
  'blanks behind a verbatim mark’s definition': `\\MakeShortVerb${fill(' ')}`,
  'blanks behind a class': `\\documentclass${fill(' ')}`,
  'blanks behind a package': `${CLASS}\\usepackage${fill(' ')}`,
  'blanks behind a language': `${CLASS}\\setmainlanguage${fill(' ')}`,
  'blanks behind a length': `\\vskip${fill(' ')}`,
  'titles on one line of a preamble': CLASS + fill('\\title{a} '),
  'verbatim marks of many kinds': Array.from(
    { length: 30_000 },
    (_, i) => `\\verb${String.fromCharCode(0x3400 + i)}`,
  ).join(' '),
  schemes: fill('a://'),
  addresses: fill('a@'),
  'a local part': `${fill('a.')}@`,
  'dots and an address': fill('a.b@'),
  lengths: fill('\\vskip 1pt plus '),
  'conditions that are false': fill('\\iffalse'),
  cells: `\\begin{tabular}{l}${fill('& ')}`,
  'language options': `${CLASS}\\usepackage[${fill('a,')}`,
  classes: fill('\\documentclass['),
  'lone surrogates': fill('\ud800'),
  'NUL units': fill('\0'),
};
const PROSE = fill(
  'The key opens the gateway, and \\emph{every} owner has \\href{x}{one} of \\texttt{them}; see~\\ref{a}.\n\n',
);

function milliseconds(text: string): number {
  const before = process.cpuUsage();
  read({ uri: 'file:///hostile.tex', format: 'latex', text });
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000;
}

describe('reading 200 KB as latex', () => {
  for (let i = 0; i < 5; i++) milliseconds(PROSE);
  const usual = Math.max(5, Array.from({ length: 5 }, () => milliseconds(PROSE)).sort((a, b) => a - b)[2]!);

  it.each(Object.entries(HOSTILE))('of %s stays within bounds', (_name, text) => {
    const taken = Math.min(...Array.from({ length: 2 }, () => milliseconds(text)));
    expect(taken / usual).toBeLessThan(MOST);
  });
});
