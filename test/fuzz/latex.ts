// LaTeX of any shape: text and commands in any order.
import fc from 'fast-check';

const TEXT = ['word', 'two words', 'naïve', '漢字', '🙂', '\u0301', 'a b c d', '.', ', ', ' ', '  ', '\t', '\uFEFF']
  .concat([
    '\n',
    '\n\n',
    '\r\n',
    '\r',
    '\f',
    '\uFFFC',
    '\0',
    '\ud800',
    '\udc00',
    '1',
    'https://a.example/b\\_c',
    'www.a.b',
  ])
  .concat([
    'g@h.example',
    '://',
    '@',
    '<x>',
    "''",
    '``',
    '`',
    "'",
    '"',
    '"a',
    '--',
    '---',
    '-',
    '~',
    '&',
    '#1',
    '^',
    '_',
  ]);
const MARKUP = [
  '{',
  '}',
  '[',
  ']',
  '(',
  ')',
  '$',
  '$$',
  '\\(',
  '\\)',
  '\\[',
  '\\]',
  '\\\\',
  '\\\\[2pt]',
  '%',
  '% c\n',
  '\\',
]
  .concat([
    '\\%',
    '\\&',
    '\\ ',
    '\\,',
    '\\-',
    '\\/',
    "\\'e",
    '\\"{u}',
    '\\c c',
    '\\v{s}',
    "\\'{\\i}",
    '\\^',
    '\\ss ',
    '\\LaTeX',
  ])
  .concat([
    '\\emph{',
    '\\section{',
    '\\section*[s]{',
    '\\footnote{',
    '\\texttt{',
    '\\verb|a{|',
    '\\verb',
    '\\href{u}{',
    '\\item ',
  ])
  .concat(['\\item[', '\\caption{', '\\begin{itemize}', '\\end{itemize}', '\\begin{description}', '\\end{description}'])
  .concat([
    '\\begin{tabular}{ll}',
    '\\end{tabular}',
    '\\begin{verbatim}',
    '\\end{verbatim}',
    '\\begin{equation}',
    '\\end{equation}',
  ])
  .concat([
    '\\begin{lstlisting}[caption={c d},x]',
    '\\end{lstlisting}',
    '\\begin{quote}',
    '\\end{quote}',
    '\\begin{foo}[a]{b c d}',
  ])
  .concat([
    '\\end{foo}',
    '\\end{',
    '\\begin',
    '\\foo',
    '\\foo{a}',
    '\\foo{one two three}',
    '\\foo[',
    '\\ref{a}',
    '\\par ',
    '\\tt ',
  ])
  .concat([
    '\\newcommand{\\foo}[1]{\\emph{#1}}',
    '\\newglossaryentry{a}{name={b},description={c d}}',
    '\\newacronym{a}{b}{c d}',
  ])
  .concat([
    '\\foreignlanguage{german}{',
    '\\selectlanguage{german}',
    '\\def\\x#1{',
    '\\let\\a=\\b',
    '\\vskip 1pt plus 2pt ',
    '\\iffalse',
  ])
  .concat([
    '\\fi',
    '\\title{',
    '\\multicolumn{2}{c}{',
    '\\enquote{',
    '\\menu{',
    '\\end{document}',
    '\\captionof{figure}{',
  ]);
const HEADS = [
  '',
  '',
  '\\documentclass{article}\n\\usepackage[german]{babel}\n\\title{A b}\n\\begin{document}\n',
  '\\documentclass{a}',
].concat(['\uFEFF', '\\section{Glossary}\n']);

/** Mixtures of up to fifty pieces. */
export const latexSoup = fc
  .tuple(fc.constantFrom(...HEADS), fc.array(fc.constantFrom(...TEXT, ...MARKUP, ...MARKUP), { maxLength: 50 }))
  .map(([head, parts]) => head + parts.join(''));
