// Styles: the inflections of one way of writing together, with what its uses tell about it.
import type { Corpus } from '../../corpus/corpus.js';
import type { TokenStream } from '../../corpus/stream.js';
import { FactFlag } from '../../facts/flags.js';
import { TokenFlag } from '../../tokens/tokens.js';
import { followsOn } from '../../corpus/stream.js';
import { isInsideSentence } from '../places.js';
import type { Use } from '../places.js';
import type { Candidate, Form, Shape } from './candidates.js';
import type { Mentions } from './mentions.js';
import type { Slot, SlotReader } from './slots.js';

/** A use and the slot it stands in. */
export interface SlottedUse extends Use {
  readonly slot: Slot;
}

/** One way of writing a word or compound, all inflections together. */
export interface Style {
  readonly shape: Shape;
  /** The style's singular form in lower case. */
  readonly text: string;
  readonly forms: readonly Form[];
  /** Uses that count as evidence, in document order, each with its slot. */
  readonly uses: readonly SlottedUse[];
  /** Uses by slot. Where most may be a name of the page's code, these are as right as they are, and count as standing alone. */
  readonly slots: Readonly<Record<Slot, number>>;
  /** Uses inside sentences of running text; the counts below are among them. */
  readonly inside: number;
  /** Every word begins with a capital. */
  readonly capitalised: number;
  /** Any letter is a capital. */
  readonly withCapital: number;
  /** A capital inside a word, and small letters behind it (ConfigMap, configMap, JSONPath). */
  readonly camel: number;
  /** A capital inside a word that begins with a small letter (configMap). */
  readonly lowerCamel: number;
  /** No small letter, several capitals (SLOWLOG). */
  readonly shouted: number;
  /** A capitalised content word stands right before: the form may be a part of a longer name. */
  readonly afterName: number;
  /** Uses as a noun that are a plural or have a determiner right before. */
  readonly determined: number;
  /** The first of several words is a name of its own (Kafka source): it is written with a capital wherever it stands. */
  readonly beginsWithName: boolean;
  /** Most uses may be a name of the page's code. */
  readonly isMostlyName: boolean;
}

type Cases = Record<
  'inside' | 'capitalised' | 'withCapital' | 'camel' | 'lowerCamel' | 'shouted' | 'afterName' | 'determined',
  number
>;

/** What tells about single uses. */
export interface Readers {
  readonly slots: SlotReader;
  readonly mentions: Mentions;
}

/** The styles of a candidate. Where only the plural differs (indexes, indices), each plural is a style. */
export function stylesOf(corpus: Corpus, readers: Readers, candidate: Candidate): Style[] {
  const byStyle = new Map<string, Form[]>();
  for (const form of candidate.forms) {
    const list = byStyle.get(form.style);
    if (list === undefined) byStyle.set(form.style, [form]);
    else list.push(form);
  }
  if (byStyle.size === 1) {
    const plurals = candidate.forms.filter((form) => form.plural);
    return plurals.length < 2 || !beginAlike(plurals)
      ? []
      : plurals.map((form) => makeStyle(corpus, readers, form.text, [form]));
  }
  return [...byStyle].map(([text, forms]) => makeStyle(corpus, readers, text, forms));
}

/** People and persons are two words, indexes and indices one. */
function beginAlike(forms: readonly Form[]): boolean {
  return new Set(forms.map((form) => form.text.slice(0, 3))).size === 1;
}

/** From so many uses as a verb on, a hyphened form without a determiner is as likely one more. */
const LEAST_VERBS = 2;

/** Of a name, such a share of uses at most is in small letters. */
const SMALL_SHARE = 0.1;

function beginsWithName(corpus: Corpus, { shape, folds }: Form): boolean {
  const [first] = folds as [number];
  return shape === 'open' && corpus.usesOfWord(first) <= SMALL_SHARE * corpus.stream.rowsOf(first).length;
}

/** From this share of uses on pages whose code has it, a form is mostly a name of code. */
const MOSTLY_NAME = 0.5;

function makeStyle(corpus: Corpus, readers: Readers, text: string, forms: readonly Form[]): Style {
  const slots: Record<Slot, number> = { attributive: 0, predicate: 0, noun: 0, verb: 0, unclear: 0, lone: 0 };
  const uses: SlottedUse[] = [];
  const cases: Cases = {
    ...{ inside: 0, capitalised: 0, withCapital: 0, camel: 0, lowerCamel: 0, shouted: 0 },
    ...{ afterName: 0, determined: 0 },
  };
  const found = forms.flatMap((form) => usesOf(corpus, readers, form));
  const named = found.filter(({ isNamed }) => isNamed).length;
  const isMostlyName = named > 0 && named >= MOSTLY_NAME * found.length;
  const read = found.map((use) => (isMostlyName && use.isNamed ? 'lone' : slotOf(readers.slots, use)));
  const isAlsoVerb = read.filter((slot) => slot === 'verb').length >= LEAST_VERBS;
  found.forEach(({ form, row }, index) => {
    const isBare = read[index] === 'noun' && form.shape !== 'open' && !readers.slots.isDetermined(row);
    const isBareName = isBare && named > 0 && !form.plural && isSmall(corpus, row);
    const isBareVerb = isBare && isAlsoVerb && form.shape === 'hyphened';
    const slot = isBareName ? 'lone' : isBareVerb ? 'unclear' : read[index]!;
    slots[slot]++;
    uses.push({ row, length: form.folds.length, slot });
    countCase(corpus, row, form.folds.length, cases);
    const isNoun = slot === 'noun' || slot === 'predicate' || slot === 'unclear';
    if (isNoun && (form.plural || readers.slots.hasDeterminer(row))) cases.determined++;
  });
  uses.sort((a, b) => a.row - b.row);
  const startsWithName = beginsWithName(corpus, forms[0]!);
  return { shape: forms[0]!.shape, text, forms, uses, slots, beginsWithName: startsWithName, isMostlyName, ...cases };
}

/** A plural is no modifier: "two elements follow" leaves it open, "it bulk-loads data" is a verb, "the webservers group" a name. */
function slotOf(slots: SlotReader, { form, row }: Found): Slot {
  const slot = slots.slotOf(row, form.folds.length);
  if (slot !== 'attributive' || !form.plural) return slot;
  return form.shape === 'open' ? 'unclear' : form.shape === 'hyphened' ? 'verb' : 'attributive';
}

interface Found {
  readonly form: Form;
  readonly row: number;
  /** It may be a name of its page's code. */
  readonly isNamed: boolean;
}

function usesOf(corpus: Corpus, readers: Readers, form: Form): Found[] {
  return form.rows
    .filter((row) => !readers.mentions.isMention(row, form.folds.length))
    .map((row) => ({ form, row, isNamed: isName(corpus, row, form) }));
}

/** A word in small letters, or with a first capital alone, that the code of its page has too; kinds and classes are judged by their capitals. */
function isName({ stream, vocabulary }: Corpus, row: number, { shape }: Form): boolean {
  if (shape === 'open' || !stream.isNameInCode(row)) return false;
  return stream.spelling[row] === stream.fold[row] || !/^.+\p{Lu}/u.test(vocabulary.textOf(stream.spelling[row]!));
}

function isSmall({ stream }: Corpus, row: number): boolean {
  return stream.spelling[row] === stream.fold[row];
}

function countCase(corpus: Corpus, row: number, length: number, cases: Cases): void {
  const { stream, vocabulary } = corpus;
  if (!isInsideSentence(stream, row)) return;
  cases.inside++;
  if (stream.spelling[row - 1] !== stream.fold[row - 1] && isContent(stream, row - 1) && followsOn(stream, row)) {
    cases.afterName++;
  }
  let capitals = 0;
  for (let i = 0; i < length; i++) if (stream.spelling[row + i] !== stream.fold[row + i]) capitals++;
  if (capitals > 0) cases.withCapital++;
  if (capitals === length) cases.capitalised++;
  if (capitals === 0 || length > 1) return;
  const text = vocabulary.textOf(stream.spelling[row]!);
  if (/\p{Ll}\p{Lu}|\p{Lu}{2}\p{Ll}{2}/u.test(text)) {
    cases.camel++;
    if (/^\p{Ll}/u.test(text)) cases.lowerCamel++;
  } else if (/^[^\p{Ll}]*$/u.test(text)) cases.shouted++;
}

function isContent(stream: TokenStream, row: number): boolean {
  const flags = stream.flags[row]!;
  return (flags & TokenFlag.word) !== 0 && (flags & FactFlag.functionWord) === 0;
}
