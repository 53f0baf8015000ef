// LaTeX of any shape: nothing throws, every unit maps to its source, reading again equals reading whole.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OPAQUE, sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read, reread, startReading } from '../../server/src/prose/read.js';
import type { SourceText } from '../../server/src/text/sourceText.js';

const TEXT = ['word', 'two words', 'naïve', '漢字', '🙂', '\u0301', 'a b c d', '.', ', ', ' ', '  ', '\t', '\uFEFF']
  .concat(['\n', '\n\n', '\r\n', '\r', '\f', '\uFFFC', '\0', '\ud800', '\udc00', '1', 'https://a.example/b\\_c', 'www.a.b'])
  .concat(['g@h.example', '://', '@', '<x>', "''", '``', '`', "'", '"', '"a', '--', '---', '-', '~', '&', '#1', '^', '_']);
const MARKUP = ['{', '}', '[', ']', '(', ')', '$', '$$', '\\(', '\\)', '\\[', '\\]', '\\\\', '\\\\[2pt]', '%', '% c\n', '\\']
  .concat(['\\%', '\\&', '\\ ', '\\,', '\\-', '\\/', "\\'e", '\\"{u}', '\\c c', '\\v{s}', "\\'{\\i}", '\\^', '\\ss ', '\\LaTeX'])
  .concat(['\\emph{', '\\section{', '\\section*[s]{', '\\footnote{', '\\texttt{', '\\verb|a{|', '\\verb', '\\href{u}{', '\\item '])
  .concat(['\\item[', '\\caption{', '\\begin{itemize}', '\\end{itemize}', '\\begin{description}', '\\end{description}'])
  .concat(['\\begin{tabular}{ll}', '\\end{tabular}', '\\begin{verbatim}', '\\end{verbatim}', '\\begin{equation}', '\\end{equation}'])
  .concat(['\\begin{lstlisting}[caption={c d},x]', '\\end{lstlisting}', '\\begin{quote}', '\\end{quote}', '\\begin{foo}[a]{b c d}'])
  .concat(['\\end{foo}', '\\end{', '\\begin', '\\foo', '\\foo{a}', '\\foo{one two three}', '\\foo[', '\\ref{a}', '\\par ', '\\tt '])
  .concat(['\\newcommand{\\foo}[1]{\\emph{#1}}', '\\newglossaryentry{a}{name={b},description={c d}}', '\\newacronym{a}{b}{c d}'])
  .concat(['\\foreignlanguage{german}{', '\\selectlanguage{german}', '\\def\\x#1{', '\\let\\a=\\b', '\\vskip 1pt plus 2pt ', '\\iffalse'])
  .concat(['\\fi', '\\title{', '\\multicolumn{2}{c}{', '\\enquote{', '\\menu{', '\\end{document}', '\\captionof{figure}{']);
const HEADS = ['', '', '\\documentclass{article}\n\\usepackage[german]{babel}\n\\title{A b}\n\\begin{document}\n', '\\documentclass{a}']
  .concat(['\uFEFF', '\\section{Glossary}\n']);

const soups = fc
  .tuple(fc.constantFrom(...HEADS), fc.array(fc.constantFrom(...TEXT, ...MARKUP, ...MARKUP), { maxLength: 50 }))
  .map(([head, parts]) => head + parts.join(''));
const source = (text: string): SourceText => ({ uri: 'file:///soup.tex', format: 'latex', text });

function expectSoundMap(text: string): void {
  let before = 0;
  const prose = read(source(text));
  expect(prose.problems.filter(({ message }) => message.includes('could not be read'))).toEqual([]);
  for (const block of prose.blocks) {
    const { content, start } = block;
    expect(start).toBeGreaterThanOrEqual(before);
    expect(start + content.sourceLength).toBeLessThanOrEqual(text.length);
    before = start;
    for (let i = 3; i < content.pieces.length; i += 3) {
      expect(content.pieces[i]!).toBeGreaterThan(content.pieces[i - 3]!);
      expect(content.pieces[i + 1]!).toBeGreaterThanOrEqual(content.pieces[i - 2]! + content.pieces[i - 1]!);
    }
    for (let i = 0; i < content.text.length; i++) {
      const from = sourceStart(block, i);
      const to = sourceEnd(block, i + 1);
      const unit = content.text[i]!;
      const slice = text.slice(from, to);
      expect(to).toBeGreaterThan(from);
      expect(to).toBeLessThanOrEqual(start + content.sourceLength);
      if (unit === OPAQUE || /^[\\`'"~-]/.test(slice)) continue;
      if (unit === ' ') expect(slice).toMatch(/^[\s{}[\]&%]/);
      else if (unit === '\uFFFD') expect(['\0', '\uFFFC', '\uFFFD']).toContain(slice);
      else expect(slice).toBe(unit);
    }
    let at = 0;
    for (const mark of content.marks) {
      expect(mark.start).toBeGreaterThanOrEqual(at);
      expect(mark.end).toBeGreaterThan(mark.start);
      at = mark.end;
    }
    expect(at).toBeLessThanOrEqual(content.text.length);
    expect(content.links.every((link) => link.start < link.end && link.end <= content.text.length)).toBe(true);
    expect(content.text).not.toMatch(/^ | {2}/);
  }
}

describe('the prose of any LaTeX', () => {
  it('maps unit by unit to its source', () => {
    fc.assert(fc.property(soups, expectSoundMap), { numRuns: 2500 });
  });

  it('maps so for every beginning of a text', () => {
    fc.assert(
      fc.property(soups, fc.double({ min: 0, max: 1, noNaN: true }), (text, part) =>
        expectSoundMap(text.slice(0, Math.floor(part * text.length))),
      ),
      { numRuns: 800 },
    );
  });

  it('is the same when read again after an edit', () => {
    fc.assert(
      fc.property(soups, soups, fc.nat(400), fc.nat(20), (text, insert, at, remove) => {
        const edited = text.slice(0, at) + insert + text.slice(at + remove);
        const before = startReading(source(text));
        const old = before.prose;
        const again = reread(before, source(edited));
        expect(JSON.stringify(again.prose)).toBe(JSON.stringify(read(source(edited))));
        expect(before.prose).toBe(old);
      }),
      { numRuns: 500 },
    );
  });
});
