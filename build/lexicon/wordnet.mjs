// Compiles WordNet's database into one module of strings: lemmas, their senses in order, and the links between senses.
import { moduleText } from './moduleText.mjs';
import { encodeNumber } from './numbers.mjs';

const parts = [
  { pos: 'noun', file: 'noun', linkMarks: ['@'] },
  { pos: 'verb', file: 'verb', linkMarks: ['@'] },
  { pos: 'adjective', file: 'adj', linkMarks: ['&'] },
  { pos: 'adverb', file: 'adv', linkMarks: [] },
];

/** Lexicographer files whose senses are left out: animals (05), food (13), plants (20). They do not count as ranks. */
const leftOut = new Set([5, 13, 20]);

/** The generated module; `read` gives a file of the database. */
export function compileWordNet(read, licence) {
  const constants = parts.map(({ pos, file, linkMarks }) => {
    const part = compilePart(parseData(read(`data.${file}`)), parseIndex(read(`index.${file}`)), linkMarks);
    return [pos, part];
  });
  return moduleText(
    "a modified extract of WordNet's words and relations, in the format that ../wordnet.ts reads",
    constants.flatMap(([pos, part]) => Object.entries(part).map(([name, text]) => [`${pos}${name}`, text])),
    licence,
  );
}

function compilePart(synsets, index, linkMarks) {
  const kept = new Map();
  for (const [lemma, { offsets, tagged }] of index) {
    const text = lemma.replaceAll('_', ' ');
    if (!/^[a-z]+([- ][a-z]+){0,2}$/.test(text)) continue;
    const senses = offsets.filter(
      (offset) => synsets.get(offset).words.includes(lemma) && !leftOut.has(synsets.get(offset).file),
    );
    const alone = senses.every(
      (offset) => synsets.get(offset).words.length === 1 && synsets.get(offset).antonyms.length === 0,
    );
    // A rare word or a phrase that nothing else names could only be a sister or a kind of something: of little use.
    if (senses.length > 0 && !(alone && (text.includes(' ') || tagged === 0))) kept.set(text, senses);
  }
  const lemmas = [...kept.keys()].sort();
  const lemmaNumber = new Map(lemmas.map((lemma, i) => [lemma, i]));

  // Senses are numbered as the sorted lemmas meet them, so that a first meeting is one mark: "!".
  const numbers = new Map();
  const number = (offset) => {
    if (!numbers.has(offset)) numbers.set(offset, numbers.size);
    return numbers.get(offset);
  };
  const senses = lemmas.map((lemma) =>
    kept
      .get(lemma)
      .map((offset) => (numbers.has(offset) ? encodeNumber(number(offset)) : (number(offset), '!')))
      .join(''),
  );
  const named = [...numbers.keys()];
  const links = named.map((offset) => {
    const targets = synsets.get(offset).links.filter(({ mark }) => linkMarks.includes(mark));
    return targets.map((target) => encodeNumber(number(target.offset))).join('');
  });

  const oppositeWords = new Set();
  const oppositeSenses = new Set();
  for (const offset of named) {
    const { words, antonyms } = synsets.get(offset);
    for (const { target, from, to } of antonyms) {
      const other = synsets.get(target);
      const pair = [words[from - 1], other.words[to - 1]].map((word) => lemmaNumber.get(word.replaceAll('_', ' ')));
      if (pair.every((i) => i !== undefined)) oppositeWords.add(encodePair(...pair));
      if (numbers.has(target)) oppositeSenses.add(encodePair(number(offset), number(target)));
    }
  }
  return {
    Lemmas: lemmas.join('\n'),
    Senses: senses.join(' '),
    Links: links.join(' '),
    OppositeWords: [...oppositeWords].sort().join(''),
    OppositeSenses: [...oppositeSenses].sort().join(''),
  };
}

/** The smaller number first: opposition has no direction, though the database names some of it in one only. */
function encodePair(a, b) {
  return encodeNumber(Math.min(a, b)) + encodeNumber(Math.max(a, b));
}

/** Lemma → offsets of its synsets, the commonest first, and how many of them a tagged corpus has (wndb(5WN), index files). */
function parseIndex(text) {
  const index = new Map();
  for (const line of text.split('\n')) {
    if (line === '' || line.startsWith(' ')) continue;
    const fields = line.trim().split(/ +/);
    const count = Number(fields[2]);
    index.set(fields[0], { offsets: fields.slice(-count), tagged: Number(fields.at(-count - 1)) });
  }
  return index;
}

/** Offset → words in their own case, lexicographer file, links and antonyms (wndb(5WN), data file format). */
function parseData(text) {
  const synsets = new Map();
  for (const line of text.split('\n')) {
    if (line === '' || line.startsWith(' ')) continue;
    const fields = line.slice(0, line.indexOf(' | ')).split(' ');
    const wordCount = parseInt(fields[3], 16);
    const words = fields.slice(4, 4 + 2 * wordCount).filter((_, i) => i % 2 === 0);
    const first = 4 + 2 * wordCount;
    const links = [];
    const antonyms = [];
    for (let i = 0; i < Number(fields[first]); i++) {
      const [mark, offset, , ends] = fields.slice(first + 1 + 4 * i, first + 5 + 4 * i);
      if (mark === '!') {
        antonyms.push({ target: offset, from: parseInt(ends.slice(0, 2), 16), to: parseInt(ends.slice(2), 16) });
      } else {
        links.push({ mark, offset });
      }
    }
    const plain = words.map((word) => word.replace(/\((a|p|ip)\)$/, ''));
    synsets.set(fields[0], { file: Number(fields[1]), words: plain, links, antonyms });
  }
  return synsets;
}
