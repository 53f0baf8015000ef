// LaTeX held against Pandoc: the words that are prose, and where ours stand.
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';
import { Zone } from '../../server/src/prose/zones.js';
import { commonLength } from './asciidocOracle.js';
import { hasPandoc, oracleWords, WORD } from './latexOracle.js';
import { tell } from './oracleTable.js';

/*
 * Where the two differ on purpose: lists of works are no prose here; a command that the document defines without arguments is one
 * opaque unit, as its words stand elsewhere; so is the argument of an unknown command if it is shorter than three words.
 */

const PAGE = `\\documentclass[11pt]{article}
\\usepackage[english]{babel}
% A comment with words.
\\title{The keys of the \\emph{buoy} gateway}
\\newcommand{\\key}[1]{\\textbf{#1}}
\\begin{document}
\\maketitle
\\begin{abstract}
In short: na\\"ive caf\\'e, Stra\\ss{}e and \\c{c}edille.
\\end{abstract}
\\section[Short]{Keys \\& locks}\\label{sec:keys}
Each \\key{access key}~opens the gate\\-way -- and more --- it \`\`is
said to be open''. Run \\texttt{foo --bar} or \\verb|a{b| with $x^2$ and
\\[ E = mc^2 \\]
where it is. Costs 50\\% less; % no comment
three % keys.
keys.\\footnote{A note with \\emph{stress}.} See \\href{https://a.b/c}{the site}.

{\\bfseries Bold} text, {\\itshape slanted} and \\textsc{Small Capitals}.
\\begin{itemize}
  \\item First item
  \\item Second
    \\begin{enumerate}
      \\item opens it.
    \\end{enumerate}
\\end{itemize}
\\begin{description}
\\item[lock] It keeps.
\\item[mast] It stands.
\\end{description}
\\begin{table}
\\caption{All the \\textbf{keys}}
\\begin{tabular}{ll}
\\hline
Name & Where \\\\ \\hline
North key & Gate \\textit{house} \\\\
\\end{tabular}
\\end{table}
\\begin{verbatim}
no prose { here
\\end{verbatim}
\\begin{quote}
Somebody said so.
\\end{quote}
\\end{document}
Nothing behind it.
`;

interface Score {
  theirs: number;
  ours: number;
  common: number;
  misplaced: string[];
  /** Milliseconds, and the text read in them. */
  theirTime: number;
  ourTime: number;
  units: number;
}

/** Adds a text to the score; false where Pandoc cannot read it. */
function compare(name: string, text: string, score: Score): boolean {
  const before = performance.now();
  const theirs = oracleWords(text);
  if (theirs === undefined) return false;
  const between = performance.now();
  const { blocks } = read({ uri: `file:///${name}`, format: 'latex', text });
  score.ourTime += performance.now() - between;
  score.theirTime += between - before;
  score.units += text.length;
  const ours: string[] = [];
  for (const block of blocks) {
    const { text: shown, marks } = block.content;
    for (const { 0: word, index } of shown.matchAll(WORD)) {
      const slice = text.slice(sourceStart(block, index), sourceEnd(block, index + word.length));
      // Markup inside a word vanishes; an accent or a letter is written as a command.
      if (slice !== word && !/[\\{}%`'"-]/.test(slice)) score.misplaced.push(`${name}: ${word} is ${slice}`);
      const isCode = marks.some(({ start, end, zones }) => (zones & Zone.code) !== 0 && start <= index && index < end);
      if (!isCode) ours.push(word);
    }
  }
  // A footnote is a block of its own here, and stands where it is called there.
  score.common += commonLength([...theirs].sort(), [...ours].sort());
  score.theirs += theirs.length;
  score.ours += ours.length;
  return true;
}

function newScore(): Score {
  return { theirs: 0, ours: 0, common: 0, misplaced: [], theirTime: 0, ourTime: 0, units: 0 };
}

function report(set: string, score: Score): void {
  const { common, misplaced } = score;
  tell({ ...score, format: 'LaTeX', oracle: 'Pandoc', set, found: common, right: common, misplaced: misplaced.length });
}

/** Documentation of the set `../shared` written in LaTeX by Pandoc itself, without colours for code. */
function* converted(folder: string, ending: string, from: string, most: number): Generator<readonly [string, string]> {
  const files = readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .filter((name) => name.endsWith(ending) && statSync(path.join(folder, name)).size > 8000)
    .sort()
    .slice(0, most);
  for (const name of files) {
    const options = ['--no-highlight', '--standalone', '--from', from, '--to', 'latex', path.join(folder, name)];
    const { stdout, status } = spawnSync('pandoc', options, { encoding: 'utf8', maxBuffer: 2 ** 28 });
    if (status === 0) yield [name, stdout];
  }
}

describe('LaTeX against Pandoc', () => {
  it('agrees on a page with the usual constructs', (context) => {
    if (!hasPandoc) return context.skip('needs Pandoc');
    const score = newScore();
    for (const [name, text] of Object.entries({ a: PAGE, b: PAGE.replaceAll('\n', '\r\n') })) {
      expect(compare(name, text, score)).toBe(true);
    }
    const { theirs, ours, common, misplaced } = score;
    expect({ ours, common, misplaced }).toEqual({ ours: theirs, common: theirs, misplaced: [] });
    expect(theirs).toBeGreaterThan(140);
  });

  for (const [set, ending, from] of [
    ['rust-book', '.md', 'gfm'],
    ['celery', '.rst', 'rst'],
  ] as const) {
    const folder = path.join(import.meta.dirname, '../../../shared/data/docs', set);
    it(`agrees on pages of ${set} that Pandoc wrote in LaTeX`, (context) => {
      if (!hasPandoc) return context.skip('needs Pandoc');
      if (!existsSync(folder)) return context.skip('needs ../shared');
      const score = newScore();
      for (const [name, text] of converted(folder, ending, from, 6)) compare(name, text, score);
      report(set, score);
      expect(score.misplaced).toEqual([]);
      expect(score.theirs).toBeGreaterThan(3000);
      expect(score.common / score.theirs).toBeGreaterThanOrEqual(0.995);
      expect(score.common / score.ours).toBeGreaterThanOrEqual(0.995);
    }, 120_000);
  }

  const handwritten = process.env.LATEX_DOCS;
  it('agrees on documents that people wrote, in the folder LATEX_DOCS', (context) => {
    if (!hasPandoc || handwritten === undefined) return context.skip('needs Pandoc, and a folder of LaTeX');
    const score = newScore();
    for (const name of readdirSync(handwritten, { recursive: true, encoding: 'utf8' })) {
      if (/\.(?:tex|latex)$/.test(name)) compare(name, readFileSync(path.join(handwritten, name), 'utf8'), score);
    }
    report('LATEX_DOCS', score);
    expect(score.misplaced).toEqual([]);
  }, 600_000);
});
