// The English profile against a treebank made by people: parts of speech, dictionary forms and sentence starts.
// Source: Universal Dependencies, English Web Treebank, development part (Silveira et al. 2014; CC BY-SA 4.0), read from `../shared`.
// It is web text, not documentation: the floors lie a little under what was measured on 2026-12-01.
import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { describe, expect, test } from 'vitest';
import winkNLP, { type ItsFunction } from 'wink-nlp';
import model from 'wink-eng-lite-web-model';
import type { BlockContent } from '../../server/src/prose/prose.js';
import { createEnglishProfile } from '../../server/src/tokens/english.js';
import { TAG, TAGS, TokenFlag } from '../../server/src/tokens/tokens.js';

const file = resolve(import.meta.dirname, '../../../shared/data/ud-ewt/dev.conllu');
const here = existsSync(file);
if (!here) console.warn(`Skipped: the treebank is not at ${file}.`);

interface GoldWord {
  readonly start: number;
  readonly end: number;
  readonly tag: string;
  readonly lemma: string;
}

/** A paragraph: its text, its words that stand alone (none of a contraction), and where its sentences start. */
interface Paragraph {
  text: string;
  readonly words: GoldWord[];
  readonly sentenceStarts: number[];
}

describe.skipIf(!here)('English Web Treebank, development part', () => {
  const paragraphs = here ? readParagraphs(readFileSync(file, 'utf8')) : [];
  const profile = createEnglishProfile();
  const blocks = profile.tokens(paragraphs.map(({ text }) => content(text)));

  test('parts of speech of the words that align', () => {
    const right = { all: 0, content: 0 };
    const seen = { all: 0, content: 0 };
    let gold = 0;
    const errors = new Map<string, number>();
    paragraphs.forEach(({ words, text }, k) => {
      const tokens = blocks[k]!;
      const rowAt = new Map(Array.from(tokens.start, (start, row) => [`${start}-${tokens.end[row]!}`, row]));
      for (const word of words) {
        if (UNCOUNTED.has(word.tag)) continue;
        gold++;
        const row = rowAt.get(`${word.start}-${word.end}`);
        if (row === undefined) continue;
        const tag = TAGS[tokens.tag[row]!]!;
        seen.all++;
        if (tag === word.tag) right.all++;
        else {
          const error = `${word.tag}→${tag}`;
          errors.set(error, (errors.get(error) ?? 0) + 1);
          if (process.env['SHOW'] === error)
            console.log(error, text.slice(Math.max(0, word.start - 30), word.end + 20));
        }
        if (CONTENT.has(word.tag)) {
          seen.content++;
          if (broad(tag) === broad(word.tag)) right.content++;
        }
      }
    });
    const accuracy = right.all / seen.all;
    console.log(
      `words aligned ${share(seen.all, gold)} of ${gold}; universal part of speech ${share(right.all, seen.all)}; ` +
        `content words with NOUN = PROPN ${share(right.content, seen.content)}; wink-nlp by itself ${wink(paragraphs).tags}`,
    );
    console.log([...errors].sort((a, b) => b[1] - a[1]).slice(0, 16));
    expect(seen.all / gold).toBeGreaterThan(0.98);
    expect(accuracy).toBeGreaterThan(0.895);
    expect(right.content / seen.content).toBeGreaterThan(0.885);
  });

  test('dictionary forms of nouns and verbs', () => {
    let right = 0;
    let all = 0;
    const errors = new Map<string, number>();
    paragraphs.forEach(({ words, text }, k) => {
      const tokens = blocks[k]!;
      const rowAt = new Map(Array.from(tokens.start, (start, row) => [start, row]));
      for (const word of words) {
        if (word.tag !== 'NOUN' && word.tag !== 'VERB') continue;
        const row = rowAt.get(word.start);
        if (row === undefined || tokens.end[row] !== word.end || TAGS[tokens.tag[row]!] !== word.tag) continue;
        all++;
        if (tokens.lemma[row] === word.lemma.toLowerCase()) right++;
        else {
          const error = `${text.slice(word.start, word.end)}: ${word.lemma}≠${tokens.lemma[row]!}`;
          errors.set(error, (errors.get(error) ?? 0) + 1);
        }
      }
    });
    console.log(`lemmas of rightly tagged nouns and verbs: ${share(right, all)} of ${all}`);
    if (process.env['SHOW'])
      console.log(
        [...errors]
          .sort((a, b) => b[1] - a[1])
          .slice(0, 60)
          .join('  '),
      );
    expect(right / all).toBeGreaterThan(0.98);
  });

  test('sentence starts within paragraphs', () => {
    let [hits, found, gold] = [0, 0, 0];
    paragraphs.forEach(({ sentenceStarts, text }, k) => {
      const tokens = blocks[k]!;
      const wanted = new Set(sentenceStarts.slice(1));
      gold += wanted.size;
      for (let row = 1; row < tokens.start.length; row++) {
        if ((tokens.flags[row]! & TokenFlag.sentenceStart) === 0) continue;
        found++;
        if (wanted.has(tokens.start[row]!)) hits++;
        else if (process.env['SHOW'] === 'starts')
          console.log(text.slice(tokens.start[row]! - 40, tokens.start[row]! + 20));
      }
    });
    console.log(
      `sentence starts: precision ${share(hits, found)}, recall ${share(hits, gold)} of ${gold}; wink-nlp ${wink(paragraphs).starts}`,
    );
    expect(hits / found).toBeGreaterThan(0.96);
    expect(hits / gold).toBeGreaterThan(0.75);
  });
});

const UNCOUNTED = new Set(['PUNCT', 'SYM', 'X']);
const CONTENT = new Set(['NOUN', 'PROPN', 'VERB', 'ADJ', 'ADV']);
const broad = (tag: string): string => (tag === 'PROPN' ? 'NOUN' : tag);
const share = (part: number, whole: number): string => `${((100 * part) / whole).toFixed(2)} %`;

function content(text: string): BlockContent {
  return {
    kind: 'paragraph',
    level: 0,
    text,
    zones: 0,
    marks: [],
    links: [],
    pieces: new Uint32Array(),
    sourceLength: 0,
  };
}

/** Bare wink-nlp by the same measures: the accuracy over the words that its tokens align with, and its sentence starts. */
function wink(paragraphs: readonly Paragraph[]): { tags: string; starts: string } {
  const nlp = winkNLP(model, ['sbd', 'pos']);
  const { pos, value, precedingSpaces, span } = nlp.its as unknown as Record<string, ItsFunction<string>>;
  let [right, all, hits, found, gold] = [0, 0, 0, 0, 0];
  for (const { text, words, sentenceStarts } of paragraphs) {
    const doc = nlp.readDoc(text);
    const values = doc.tokens().out(value!);
    const spaces = doc.tokens().out(precedingSpaces!);
    const tags = doc.tokens().out(pos!);
    const tagOf = new Map<string, string>();
    const starts: number[] = [];
    let at = 0;
    values.forEach((word, k) => {
      at += spaces[k]!.length;
      tagOf.set(`${at}-${at + word.length}`, tags[k]!);
      starts.push(at);
      at += word.length;
    });
    for (const word of words) {
      const tag = UNCOUNTED.has(word.tag) ? undefined : tagOf.get(`${word.start}-${word.end}`);
      if (tag === undefined) continue;
      all++;
      if (tag === word.tag) right++;
    }
    const wanted = new Set(sentenceStarts.slice(1));
    gold += wanted.size;
    const spans = doc.sentences().out(span!) as unknown as number[][];
    for (const [first] of spans.slice(1)) {
      found++;
      if (wanted.has(starts[first!]!)) hits++;
    }
  }
  return {
    tags: `${share(right, all)} of ${all}`,
    starts: `precision ${share(hits, found)}, recall ${share(hits, gold)}`,
  };
}

/** Reads the ten columns of CoNLL-U; the sentences of a paragraph are joined by a space. */
function readParagraphs(source: string): Paragraph[] {
  const paragraphs: Paragraph[] = [];
  for (const sentence of source.split(/\n\n+/)) {
    const lines = sentence.split('\n').filter((line) => line !== '');
    const text = lines.find((line) => line.startsWith('# text = '))?.slice('# text = '.length);
    if (text === undefined) continue;
    let paragraph = paragraphs.at(-1);
    if (paragraph === undefined || lines.some((line) => line.startsWith('# newpar') || line.startsWith('# newdoc'))) {
      paragraph = { text: '', words: [], sentenceStarts: [] };
      paragraphs.push(paragraph);
    }
    if (paragraph.text !== '') paragraph.text += ' ';
    const offset = paragraph.text.length;
    paragraph.text += text;
    paragraph.sentenceStarts.push(offset);
    let at = 0;
    let partsUntil = 0;
    for (const line of lines) {
      const [id, form, lemma, tag] = line.split('\t');
      if (line.startsWith('#') || id === undefined || form === undefined || id.includes('.')) continue;
      if (id.includes('-')) {
        partsUntil = Number(id.split('-')[1]);
        at = text.indexOf(form, at) + form.length;
      } else if (Number(id) > partsUntil) {
        const start = text.indexOf(form, at);
        at = start + form.length;
        paragraph.words.push({ start: offset + start, end: offset + at, tag: tag!, lemma: lemma! });
      }
    }
  }
  return paragraphs;
}

test('every tag of the treebank has a code', () => {
  for (const tag of [
    'NOUN',
    'PROPN',
    'VERB',
    'AUX',
    'ADJ',
    'ADV',
    'PRON',
    'DET',
    'ADP',
    'PART',
    'CCONJ',
    'SCONJ',
    'NUM',
  ]) {
    expect(TAG).toHaveProperty(tag);
  }
});
