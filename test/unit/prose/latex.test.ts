// LaTeX: what each construct reads as, and where it stands in the source.
import { describe, expect, it } from 'vitest';
import { reread, startReading } from '../../../server/src/prose/read.js';
import type { SourceText } from '../../../server/src/text/sourceText.js';
import { outline, prose, sourceOf } from './reading.js';

const latex = (text: string): string[] => outline(text, 'latex');
const glossary = (text: string): string[] =>
  prose(text, 'latex').blocks.map(({ content }) => `${content.glossary ?? '-'}: ${content.text}`);
const languages = (text: string): string[] =>
  prose(text, 'latex').blocks.map(({ content }) => `${content.language ?? '-'}: ${content.text}`);
const problems = (text: string): string[] => prose(text, 'latex').problems.map(({ message }) => message);

describe('LaTeX blocks', () => {
  it('are headings with fixed levels, and paragraphs between blank lines', () => {
    expect(
      latex(
        '\\chapter{Keys}\\label{a}\nOne\nkey.\n  \nTwo.\\par Three.\n\\subsection*[no]{Use}\n\\paragraph{So} it is.',
      ),
    ).toEqual([
      ...['heading1[heading]: Keys', 'paragraph: One key.', 'paragraph: Two.', 'paragraph: Three.'],
      ...['heading3[heading]: Use', 'heading5[heading]: So', 'paragraph: it is.'],
    ]);
  });

  it('are the title and the body alone where a class has a preamble', () => {
    const page =
      '\\documentclass{article}\n% \\title{No}\n\\usepackage{x}\nNo prose.\n\\title{The \\emph{keys}\\thanks{To all.}}\n\\author{No One}\n' +
      '\\begin{document}\n\\maketitle\n\\begin{abstract}In short.\\end{abstract}\nText.\n\\end{document}\nNo more.';
    expect(latex(page)).toEqual([
      ...['heading1[heading]: The keys', 'paragraph: To all.', 'paragraph: In short.', 'paragraph: Text.'],
    ]);
    expect(latex('\\documentclass{article}\nNo prose.')).toEqual([]);
    expect(latex('A chapter that others take in.')).toEqual(['paragraph: A chapter that others take in.']);
  });

  it('are items, terms with definitions, cells, captions, footnotes', () => {
    expect(
      latex(
        'Before\n\\begin{itemize}\n\\item First\n\\item[--] Second\n\\begin{description}\\item[key] It opens.\n\n More.\\item [a lock]\nIt keeps.' +
          '\\end{description}\n\\end{itemize}\nAfter',
      ),
    ).toEqual([
      ...[
        'paragraph: Before',
        'listItem: First',
        'listItem: Second',
        'definedTerm[definedTerm]: key',
        'definition: It opens.',
      ],
      ...['definition: More.', 'definedTerm[definedTerm]: a lock', 'definition: It keeps.', 'paragraph: After'],
    ]);
    expect(
      latex(
        '\\begin{table}\\caption[no]{All keys}\\begin{tabular}{l|p{2cm}}\\hline A key & \\multicolumn{2}{c}{B \\textit{lock}} \\\\[2pt]\nC & D\\\\' +
          '\\end{tabular}\\end{table}\nText\\footnote{A note.\n\nOf two.} goes on.',
      ),
    ).toEqual([
      ...[
        'caption: All keys',
        'tableCell[tableCell]: A key',
        'tableCell[tableCell]: B lock',
        'tableCell[tableCell]: C',
      ],
      ...['tableCell[tableCell]: D', 'paragraph: Text goes on.', 'paragraph: A note.', 'paragraph: Of two.'],
    ]);
  });

  it('are frames with their titles', () => {
    expect(
      latex(
        '\\begin{frame}<1->[plain]{The key}{More of it}\n\\frametitle{Use}\\begin{block}{How}Turn it.\\end{block}\\end{frame}',
      ),
    ).toEqual([
      ...[
        'heading3[heading]: The key',
        'caption[heading]: More of it',
        'heading3[heading]: Use',
        'caption: How',
        'paragraph: Turn it.',
      ],
    ]);
  });

  it('are quotations and safety messages', () => {
    expect(
      latex(
        '\\begin{quote}They said it.\\end{quote}\n\\begin{warning}Hot.\\end{warning}\n\\begin{sphinxadmonition}{caution}{Take care:}Wet.\\end{sphinxadmonition}\n\\begin{note}Cold.\\end{note}',
      ),
    ).toEqual([
      ...[
        'paragraph[quotation]: They said it.',
        'paragraph[safetyMessage]: Hot.',
        'caption[safetyMessage]: Take care:',
      ],
      ...['paragraph[safetyMessage]: Wet.', 'paragraph: Cold.'],
    ]);
  });
});

describe('LaTeX text', () => {
  it('takes no brace in a comment for an argument', () => {
    expect(latex('Some \\emph % of {many}\n\nkeys.')).toEqual(['paragraph: Some', 'paragraph: keys.']);
    expect(latex('Some \\emph % of {many}\n% and [more]\n{old keys}.')).toEqual(['paragraph: Some old keys.']);
  });

  it('runs on through commands of style, and has zones and links', () => {
    expect(
      latex(
        "An \\emph{access \\textbf{key}} in {\\bfseries bold}, \\enquote{so to say}, ``four or five words'', \\menu{File > Save}, \\href{https://a.b}{the site}, \\term{lock}.",
      ),
    ).toEqual([
      'paragraph: An access key in bold, <quotation:so to say>, <quotation:“four or five words”>, <uiLabel:File > Save>, <linkText:the site>, <definedTerm:lock>.',
    ]);
    expect(prose('\\href{https://a.b}{the site}', 'latex').blocks[0]!.content.links).toEqual([
      { start: 0, end: 8, target: 'https://a.b' },
    ]);
  });

  it('has code, mathematics, references and addresses as opaque units', () => {
    expect(
      latex(
        'Run \\texttt{a b}, \\verb|c{|, \\lstinline!d!, \\mintinline{sh}{e} with $x^2$ or \\(y\\);\n\\[ z \\]\nsee \\ref{f}, \\cite[p.~3]{g}, \\url{http://h_i}, ' +
          'https://j.k/l\\_m. \\includegraphics[width=1cm]{n} {\\tt o}',
      ),
    ).toEqual(['paragraph: Run @, @, @, @ with @ or @; @ see @, @, @, @. @ <code:o>']);
    expect(latex('\\MakeShortVerb{\\|}\nRun |a b| now.')).toEqual(['paragraph: Run @ now.']);
    expect(latex('\\documentclass{ltxdoc}\\begin{document}Run |a| now.')).toEqual(['paragraph: Run @ now.']);
  });

  it('leaves out listings, displays, comments and what sets things', () => {
    expect(
      latex(
        '\\begin{verbatim}\nno \\section{No}\n\\end{verbatim}\n\\begin{lstlisting}[language=C,caption={The \\emph{code}}]\nno\n\\end{lstlisting}\n' +
          '\\begin{minted}{py}\nno\n\\end{minted}\n\\begin{tikzpicture}no\\end{tikzpicture}\n\\iffalse no \\fi\\begin{comment}no\\end{comment}\n' +
          '\\lstinputlisting[caption=Another one]{x.c}\n\\setlength{\\parindent}{0pt}\\vskip 3pt plus 1pt\n\\newcommand{\\a}[1]{no #1}\\def\\b#1{no}\\let\\c=\\d\n' +
          'One % no\ntwo, thr%\n  ee\\index{no}\\label{no}.\n\\begin{equation}\nno\n\\end{equation}\n',
      ),
    ).toEqual(['caption: The code', 'caption: Another one', 'paragraph: One two, three. @']);
  });

  it('decodes accents, letters, marks and blanks', () => {
    expect(
      latex(
        "na\\\"ive caf\\'e Stra\\ss e \\c{c}a \\v Sk \\'{\\i}, 50\\,\\% of~foo\\_bar -- gate\\-way---``a'' \\& \\LaTeX{} \\dots",
      ),
    ).toEqual(['paragraph: naïve café Straße ça Šk í, 50\u00A0% of\u00A0foo_bar – gateway—“a” & LaTeX …']);
    expect(sourceOf("The caf\\'e opens", 'é', 'latex')).toBe("\\'e");
    expect(sourceOf('The gate\\-way opens', 'gateway', 'latex')).toBe('gate\\-way');
    expect(sourceOf('\r\nThe 🙂 key\r\nring', 'key ring', 'latex')).toBe('key\r\nring');
  });
});

describe('commands of no table', () => {
  it('are what their definition in the document makes of them', () => {
    expect(
      latex(
        '\\newcommand{\\prod}{Evenword}\\newcommand\\cmd[1]{\\texttt{#1}}\\newcommand*{\\key}[2][x]{\\emph{#2}}\\newcommand{\\ui}[1]{\\guilabel{#1}}' +
          '\\newcommand{\\warn}[1]{\\begin{warning}#1\\end{warning}}\\lstnewenvironment{sh}{}{}\\newenvironment{box}[1]{\\begin{quote}}{\\end{quote}}\n' +
          'The \\prod{} server runs \\cmd{a}; a \\key[b]{main key}; press \\ui{Save}.\\warn{Hot.}\n\\begin{sh}\nno\n\\end{sh}\n\\begin{box}{no}Said.\\end{box}',
      ),
    ).toEqual([
      'paragraph: The @ server runs @; a main key; press <uiLabel:Save>.',
      ...['paragraph[safetyMessage]: Hot.', 'paragraph[quotation]: Said.'],
    ]);
  });

  it('leave no trace where their definition only sets something', () => {
    expect(
      latex(
        '\\providecommand{\\tight}{%\n \\setlength{\\itemsep}{0pt}\\vskip 3pt plus 1fil}\\newcommand{\\app}{\\textsf{Evenword}}\n' +
          '\\begin{itemize}\\tight\\item One \\app.\\end{itemize}\\tight Two',
      ),
    ).toEqual(['listItem: One @.', 'paragraph: Two']);
  });

  it('are opaque, but for arguments that are prose', () => {
    expect(
      latex(
        'The \\foo{a} and \\foo[b]{c}{d} of \\product.\n\n\\remark{All the keys open.}\n\n\\setup{a=b, c=d}\n\n\\begin{foo}[a]{2cm}In it.\\end{foo}',
      ),
    ).toEqual([...['paragraph: The @ and @ of @.', 'paragraph: All the keys open.', 'paragraph: In it.']]);
  });
});

describe('glossaries in LaTeX', () => {
  it('are entries of the packages glossaries, acro and acronym', () => {
    expect(
      glossary(
        '\\newglossaryentry{key}{name={access key},plural={x},description={It opens, or closes, a \\emph{gate}}}\\newacronym[a=b]{api}{API}{application programming interface}' +
          '\\DeclareAcronym{ml}{short=ML,long={machine learning}}\\begin{acronym}\\acro{OS}{operating system}\\end{acronym}',
      ),
    ).toEqual([
      ...['headword: access key', 'definition: It opens, or closes, a gate', 'headword: API'],
      ...['alsoCalled: application programming interface', 'headword: ML', 'alsoCalled: machine learning'],
      ...['headword: OS', 'alsoCalled: operating system'],
    ]);
  });

  it('are description lists in a section of that name', () => {
    const list = '\\begin{description}\\item[lock] See access key.\\item[mast] It stands.\\end{description}';
    expect(glossary(`\\section{Glossary}${list}\\section{Use}${list}`)).toEqual([
      ...['-: Glossary', 'headword: lock', 'see: See access key.', 'headword: mast', 'definition: It stands.'],
      ...['-: Use', '-: lock', '-: See access key.', '-: mast', '-: It stands.'],
    ]);
  });
});

describe('languages in LaTeX', () => {
  it('are the document’s by babel or polyglossia', () => {
    const stated = (preamble: string): string | undefined =>
      prose(`\\documentclass[ngerman]{article}\n${preamble}\n\\begin{document}A\\end{document}`, 'latex').language;
    expect(stated('\\usepackage[french,british]{babel}')).toBe('en-GB');
    expect(stated('\\usepackage[main=spanish,english]{babel}')).toBe('es');
    expect(stated('\\usepackage{babel}')).toBe('de');
    expect(stated('%\\usepackage[french]{babel}')).toBeUndefined();
    expect(stated('\\setdefaultlanguage[variant=uk]{english}')).toBe('en');
  });

  it('are a block’s own; words of another language inside a text are a quotation', () => {
    const page = (body: string): string => `\\documentclass{a}\\usepackage[english]{babel}\n\\begin{document}${body}`;
    expect(
      languages(
        page(
          'One.\n\n\\begin{otherlanguage}{ngerman}Zwei mit "Ubung.\\end{otherlanguage}\\selectlanguage{french}Trois.\n\n\\selectlanguage{english}Four.',
        ),
      ),
    ).toEqual(['-: One.', 'de: Zwei mit Übung.', 'fr: Trois.', '-: Four.']);
    expect(
      latex(
        page(
          'A \\foreignlanguage{french}{mot juste}, \\textgerman{ein Wort} and \\foreignlanguage{british}{one colour}.',
        ),
      ),
    ).toEqual(['paragraph: A <quotation:mot juste>, <quotation:ein Wort> and one colour.']);
  });
});

describe('broken LaTeX', () => {
  it('is read as far as it goes, and says what has no end', () => {
    expect(latex('One \\enquote{two\n\nthree} four.')).toEqual([
      'paragraph: One <quotation:two>',
      'paragraph: three four.',
    ]);
    expect(problems('One \\enquote{two\n\nthree} four.')).toEqual([
      'The argument of \\enquote has no end in its paragraph.',
      'A brace is closed here that was not opened.',
    ]);
    expect(latex('One $x two\n\nthree')).toEqual(['paragraph: One @', 'paragraph: three']);
    expect(latex('\\begin{itemize}\\item one\n\\section{Two} three')).toEqual([
      'listItem: one',
      'heading2[heading]: Two',
      'paragraph: three',
    ]);
    expect(problems('\\begin{itemize}\\item one\n\\section{Two} three')).toEqual([
      '\\begin{itemize} has no end before the next section.',
    ]);
    expect(latex('\\begin{verbatim}\nno\n\nyes \\end{foo} }')).toEqual(['paragraph: yes']);
    expect(problems('\\begin{verbatim}\nno\n\nyes \\end{foo} }')).toEqual([
      ...[
        '\\begin{verbatim} has no end in the document.',
        '\\end{foo} ends nothing that is open.',
        'A brace is closed here that was not opened.',
      ],
    ]);
    expect(latex('\\section{One\n\ntwo')).toEqual(['heading2[heading]: One', 'paragraph: two']);
    expect(latex('\\label{one\ntwo')).toEqual(['paragraph: two']);
  });

  it('is read beyond 256 levels as one', () => {
    const { blocks, problems: said } = prose(`${'{'.repeat(300)}deep${'}'.repeat(300)} text`, 'latex');
    expect(blocks.map(({ content }) => content.text)).toEqual(['deep text']);
    expect(said.map(({ message }) => message)).toEqual(['Groups nested more than 256 levels deep are read as one.']);
  });

  it('keeps the contents of untouched blocks when read again', () => {
    const text = (body: string): SourceText => ({ uri: 'file:///a.tex', format: 'latex', text: body });
    const before = startReading(text('One.\n\nTwo.\n\nThree.'));
    const after = reread(before, text('One.\n\nTwo and more.\n\nThree.'));
    expect(after.prose).toEqual(startReading(after.source).prose);
    expect(after.prose.blocks[0]!.content).toBe(before.prose.blocks[0]!.content);
    expect(after.prose.blocks[2]!.content).toBe(before.prose.blocks[2]!.content);
  });
});
