// Answers in generated files of any style: the expected difference, and not a byte else.
import fc from 'fast-check';
import { parseDocument, Lexer } from 'yaml';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../../server/src/termbase/answer.js';
import { answerEdits } from '../../server/src/termbase/edit.js';
import { parseTermbase } from '../../server/src/termbase/parse.js';
import type { Termbase } from '../../server/src/termbase/termbase.js';
import { termKey, termText } from '../../server/src/termbase/termKey.js';
import { applyEdits } from '../../server/src/text/edits.js';

/** Strings that YAML is known to misread when they are not quoted, and letters of many kinds. */
const oddTerm = fc
  .oneof(
    fc.constantFrom(
      'yes',
      'no',
      'on',
      'NULL',
      '~',
      '1.0',
      '0x1F',
      '12:30',
      '2026-01-01',
      'C#',
      'key: value',
      'a #b',
      '- dash',
      '?',
      ':',
    ),
    fc.constantFrom(
      '[a]',
      '{b}',
      'a, b',
      "it's",
      '"quoted"',
      '*star',
      '&and',
      '!tag',
      '%rate',
      '@at',
      '`tick`',
      '|',
      '>',
      '---',
      '...',
      '<<',
      '=',
    ),
    fc.constantFrom(
      'größe',
      '数据中心',
      '🛟 buoy',
      'e\u0301tat',
      'a\u200db',
      '\\n',
      'tab\there',
      'İstanbul',
      '\u0007bell',
      'end:',
      'NaN',
      '.inf',
    ),
    fc.stringMatching(/^[a-z]{1,8}( [a-z]{1,8}){0,2}$/),
    fc.string({ unit: 'grapheme', minLength: 1, maxLength: 12 }),
  )
  .filter((text) => termText(text) !== '');

interface Style {
  quote: 'plain' | 'single' | 'double';
  lists: 'flow' | 'block';
  indent: string;
  dash: string;
  comment: boolean;
  blank: boolean;
  lineBreak: string;
  lastBreak: boolean;
  oneLine: boolean;
}

const style: fc.Arbitrary<Style> = fc.record({
  quote: fc.constantFrom('plain', 'single', 'double'),
  lists: fc.constantFrom('flow', 'block'),
  indent: fc.constantFrom('', '  ', '    '),
  dash: fc.constantFrom('- ', '-   '),
  comment: fc.boolean(),
  blank: fc.boolean(),
  lineBreak: fc.constantFrom('\n', '\r\n'),
  lastBreak: fc.boolean(),
  oneLine: fc.boolean(),
});

interface Model {
  concepts: { admitted: string[]; deprecated: string[]; preferred: string; note: string | undefined }[];
  apart: string[][];
  later: string[][];
}

/** Cuts a list of distinct terms into concepts and groups; some terms stay over for the answers. */
const modelAndSpare = fc
  .tuple(
    fc.uniqueArray(oddTerm, { minLength: 4, maxLength: 24, selector: termKey }),
    fc.array(fc.tuple(fc.nat(2), fc.nat(2), fc.option(oddTerm, { nil: undefined })), { maxLength: 4 }),
    fc.nat(2),
    fc.nat(2),
  )
  .map(([terms, sizes, apartGroups, laterGroups]) => {
    const rest = [...terms];
    const model: Model = { concepts: [], apart: [], later: [] };
    for (const [admitted, deprecated, note] of sizes) {
      const preferred = rest.shift();
      if (preferred === undefined) break;
      model.concepts.push({
        preferred,
        admitted: rest.splice(0, admitted),
        deprecated: rest.splice(0, deprecated),
        note,
      });
    }
    for (let i = 0; i < apartGroups && rest.length >= 2; i++) model.apart.push(rest.splice(0, 2));
    for (let i = 0; i < laterGroups && rest.length >= 2; i++) model.later.push(rest.splice(0, 2));
    return { model, spare: rest };
  });

/** Writes a model in a style; independent of the program's own writing. */
function write(model: Model, s: Style): string {
  const quoted = (text: string): string => {
    if (s.quote === 'plain' && /^[a-z]{3,}( [a-z]+)*$/u.test(text) && !/^(yes|true|false|null)$/u.test(text))
      return text;
    if (s.quote === 'single' && /^[\p{L} ,:#'-]+$/u.test(text)) return `'${text.replaceAll("'", "''")}'`;
    return JSON.stringify(text);
  };
  const remark = (text: string): string => (s.comment ? ` # ${text}` : '');
  const lines: string[] = s.comment ? ['# House terms: [not], {yaml}', ''] : [];
  lines.push(`evenword: 1${remark('format')}`);
  const list = (key: string, terms: string[], indent: string): void => {
    if (terms.length === 0) return;
    if (s.lists === 'flow') lines.push(`${indent}${key}: [${terms.map(quoted).join(', ')}]${remark(key)}`);
    else
      lines.push(
        `${indent}${key}:`,
        ...terms.map((term) => `${indent}${s.indent}${s.dash}${quoted(term)}${remark('t')}`),
      );
  };
  if (model.concepts.length > 0) lines.push(`concepts:${remark('decided')}`);
  for (const [index, concept] of model.concepts.entries()) {
    if (s.blank && index > 0) lines.push('');
    if (s.comment) lines.push(`${s.indent}# concept ${index}`);
    const inner = ' '.repeat(s.indent.length + s.dash.length);
    if (s.oneLine && index % 2 === 0) {
      const parts = [`preferred: ${quoted(concept.preferred)}`];
      if (concept.admitted.length > 0) parts.push(`admitted: [${concept.admitted.map(quoted).join(',')}]`);
      if (concept.deprecated.length > 0) parts.push(`deprecated: [ ${concept.deprecated.map(quoted).join(' , ')} ]`);
      lines.push(`${s.indent}${s.dash}{ ${parts.join(', ')} }${remark('one line')}`);
      continue;
    }
    lines.push(`${s.indent}${s.dash}preferred: ${quoted(concept.preferred)}${remark('use this')}`);
    list('admitted', concept.admitted, inner);
    list('deprecated', concept.deprecated, inner);
    if (concept.note !== undefined) lines.push(`${inner}note: ${JSON.stringify(concept.note)}`);
    if (s.comment && index % 2 === 1) lines.push(`${inner}# more to come`);
  }
  for (const key of ['apart', 'later'] as const) {
    if (model[key].length === 0) continue;
    if (s.blank) lines.push('');
    lines.push(
      `${key}:`,
      ...model[key].map((group) => `${s.indent}${s.dash}[${group.map(quoted).join(', ')}]${remark(key)}`),
    );
  }
  if (s.comment) lines.push('# end');
  return lines.join(s.lineBreak) + (s.lastBreak ? s.lineBreak : '');
}

/** What a termbase says, one line for each statement. */
function statements(termbase: Termbase): string[] {
  return [
    ...termbase.concepts.flatMap(({ preferred, terms, note }) => [
      ...terms.map((term) => `${preferred.text} ⟵ ${term.status} ${term.text}`),
      `${preferred.text} note ${note}`,
    ]),
    ...termbase.apart.map(({ terms }) => `apart ${terms.map(({ text }) => text).join(' | ')}`),
    ...termbase.later.map(({ terms, uses }) => `later ${terms.map(({ text }) => text).join(' | ')} ${uses}`),
  ];
}

function comments(text: string): string[] {
  return [...new Lexer().lex(text)].filter((token) => token.startsWith('#'));
}

/** Everything but insertions is a replacement; what may be replaced is an empty value and nothing else. */
function expectOnlyInsertions(text: string, answer: Answer): { after: string } | undefined {
  const result = answerEdits(text, answer);
  if (result.kind === 'refused') return undefined;
  for (const { span } of result.edits) expect(text.slice(span.start, span.end)).toBe('');
  const after = applyEdits(text, result.edits);
  expect(comments(after)).toEqual(comments(text));
  expect(parseDocument(after).errors).toEqual([]);
  if (text.includes('\r\n')) expect(after.replaceAll('\r\n', '')).not.toContain('\n');
  expect(answerEdits(after, answer)).toEqual({ kind: 'edits', edits: [] });
  return { after };
}

function difference(before: string, after: string): { gone: string[]; come: string[] } {
  const was = statements(parseTermbase(before, '').termbase);
  const is = statements(parseTermbase(after, '').termbase);
  return { gone: was.filter((line) => !is.includes(line)), come: is.filter((line) => !was.includes(line)) };
}

const sorted = (lines: string[]): string[] => [...lines].sort();

describe('an answer in any file', () => {
  it('reads back as written, whatever the style', () => {
    fc.assert(
      fc.property(modelAndSpare, style, ({ model }, s) => {
        const { termbase, problems } = parseTermbase(write(model, s), '');
        expect(problems).toEqual([]);
        const read = termbase.concepts.map(({ terms }) => terms.map(({ text }) => text));
        expect(read).toEqual(model.concepts.map((c) => [c.preferred, ...c.admitted, ...c.deprecated].map(termText)));
      }),
    );
  });

  it('of new terms makes one new concept', () => {
    fc.assert(
      fc.property(modelAndSpare, style, fc.constantFrom('prefer', 'either'), ({ model, spare }, s, kind) => {
        fc.pre(spare.length >= 2);
        const text = write(model, s);
        const terms = spare.map(termText);
        const answer: Answer = kind === 'prefer' ? { kind, terms, preferred: terms[0]! } : { kind: 'either', terms };
        const { after } = expectOnlyInsertions(text, answer)!;
        const status = kind === 'prefer' ? 'deprecated' : 'admitted';
        const [preferred, ...others] = terms;
        expect(difference(text, after)).toEqual({
          gone: [],
          come: [
            `${preferred} ⟵ preferred ${preferred}`,
            ...others.map((term) => `${preferred} ⟵ ${status} ${term}`),
            `${preferred} note undefined`,
          ],
        });
      }),
    );
  });

  it('about a known concept adds the new terms to it and nothing else', () => {
    fc.assert(
      fc.property(
        modelAndSpare,
        style,
        fc.nat(),
        fc.constantFrom('prefer', 'either'),
        ({ model, spare }, s, pick, kind) => {
          fc.pre(spare.length >= 1 && model.concepts.length >= 1);
          const text = write(model, s);
          const concept = model.concepts[pick % model.concepts.length]!;
          const preferred = termText(concept.preferred);
          const fresh = spare.map(termText);
          const answer: Answer =
            kind === 'prefer'
              ? { kind, terms: [...concept.deprecated, ...fresh], preferred }
              : { kind: 'either', terms: [...fresh, ...concept.admitted, preferred] };
          const { after } = expectOnlyInsertions(text, answer)!;
          const status = kind === 'prefer' ? 'deprecated' : 'admitted';
          const { gone, come } = difference(text, after);
          expect(gone).toEqual([]);
          expect(sorted(come)).toEqual(sorted(fresh.map((term) => `${preferred} ⟵ ${status} ${term}`)));
        },
      ),
    );
  });

  it('of two concepts or not now adds one group', () => {
    fc.assert(
      fc.property(modelAndSpare, style, fc.constantFrom('apart', 'later'), ({ model, spare }, s, kind) => {
        fc.pre(spare.length >= 2);
        const text = write(model, s);
        const terms = spare.map(termText);
        const { after } = expectOnlyInsertions(text, { kind, terms })!;
        const come = kind === 'apart' ? `apart ${terms.join(' | ')}` : `later ${terms.join(' | ')} undefined`;
        expect(difference(text, after)).toEqual({ gone: [], come: [come] });
      }),
    );
  });

  it('against the file is refused with a line of the file', () => {
    fc.assert(
      fc.property(modelAndSpare, style, ({ model }, s) => {
        fc.pre(model.concepts.length >= 2);
        const text = write(model, s);
        const [one, other] = model.concepts;
        const result = answerEdits(text, { kind: 'prefer', preferred: one!.preferred, terms: [other!.preferred] });
        expect(result.kind).toBe('refused');
        if (result.kind !== 'refused') return;
        expect(result.code).toBe('several-concepts');
        expect(text.split(/\r?\n/u)[result.line! - 1]).toContain('preferred:');
      }),
    );
  });

  it('one after the other leaves a sound file that says all of them', () => {
    fc.assert(
      fc.property(modelAndSpare, style, fc.array(fc.nat(), { maxLength: 8 }), ({ model, spare }, s, picks) => {
        let text = fc.stringify(picks).length % 5 === 0 ? '' : write(model, s);
        const pool = [...spare, ...model.concepts.map(({ preferred }) => preferred)];
        fc.pre(pool.length >= 2);
        for (const pick of picks) {
          const terms = [pool[pick % pool.length]!, pool[(pick >>> 8) % pool.length]!];
          const kinds: Answer[] = [
            { kind: 'prefer', terms, preferred: terms[0]! },
            { kind: 'either', terms },
            { kind: 'apart', terms },
            { kind: 'later', terms, uses: pick % 100 },
          ];
          const answer = kinds[pick % 4]!;
          const result = answerEdits(text, answer);
          if (result.kind === 'refused') {
            expect(result.code).not.toBe('cannot-write');
            expect(result.code).not.toBe('broken-file');
            continue;
          }
          const after = applyEdits(text, result.edits);
          expect(parseTermbase(after, '').problems).toEqual([]);
          const { gone } = difference(text, after);
          expect(gone.every((line) => line.startsWith('apart ') || line.startsWith('later '))).toBe(true);
          text = after;
        }
      }),
    );
  });
});

describe('any text at all', () => {
  it('is read without throwing and answered without breaking', () => {
    const piece = fc.constantFrom(
      'concepts:',
      'preferred:',
      ' ',
      '\n',
      '  ',
      '- ',
      '[',
      ']',
      '{',
      '}',
      ',',
      '"',
      "'",
      ':',
      '#',
      'a',
      'b',
      '|',
      '&x',
      '*x',
      '!',
      '\t',
      '? ',
      '\r',
      '---\n',
    );
    fc.assert(
      fc.property(
        fc.array(piece, { maxLength: 30 }).map((pieces) => pieces.join('')),
        (text) => {
          parseTermbase(text, '');
          const result = answerEdits(text, { kind: 'prefer', terms: ['b', 'c'], preferred: 'a' });
          if (result.kind === 'edits') expect(parseTermbase(applyEdits(text, result.edits), '').usable).toBe(true);
        },
      ),
      { numRuns: 1500 },
    );
  });
});
