// Closed sets of English words and signs that the scanner, the sentence splitter and the mends rely on.

const set = (words: string): ReadonlySet<string> => new Set(words.split(/\s+/));

/** Words after which `'s` is short for *is*, *has* or *us*, not a possessive. */
export const IS_CONTRACTIONS = set(
  'it that this there here what who where when why how he she let everything something nothing everyone someone',
);

/** Symbols and short names of units as they are written right after a number, in lower case. SI brochure (BIPM 2019) and IEC 80000-13. */
export const UNITS = set(`
  b kb mb gb tb pb eb kib mib gib tib pib bit kbit mbit gbit bps kbps mbps gbps s ms us µs μs ns ps min h hr hrs d w
  px pt em rem vh vw dpi ppi fps rpm hz khz mhz ghz v mv kv a ma mah ah kw mw gw kwh wh k m km cm mm µm μm nm mi ft in
  g kg mg l ml dl dbm db pa hpa kpa mpa bar psi lb oz lx lm cd mol n j kj nits x am pm
`);

/** Abbreviations that a full stop follows without ending a sentence, in lower case and without the stop. */
export const STOPPED_ABBREVIATIONS = set(`
  mr mrs ms dr prof st sr jr messrs gen col capt lt sgt rev hon gov sen rep
  jan feb apr jun jul aug sept sep oct nov dec drs hrs
  vs approx dept est ca cf al viz esp incl excl resp e.g i.e eg ie ibid
`);

/** Abbreviations that a number follows: `No. 5`, `Fig. 3`. Before anything else their stop ends the sentence. */
export const NUMBERED_ABBREVIATIONS = set(
  'no nos fig figs sec secs ch chap vol vols p pp eq eqs ref refs art par tab app ver v',
);

/** Determiners that show a verb before them and a noun after: articles, demonstratives, possessives, quantifiers. */
export const DETERMINERS = set(
  'the a an this that these those your its my our their his her each every any some all both no another',
);

/** Modal verbs, and *to*, after which the base form of a verb comes. */
export const BEFORE_BASE_FORM = set(
  "to can could may might must shall should will would can't cannot couldn't mustn't shouldn't won't wouldn't",
);

/** Nouns that open a sentence before a determiner without being an imperative. */
export const OPENING_NOUNS = set(
  'today tomorrow yesterday tonight sometimes data media thanks half monday tuesday wednesday thursday friday saturday sunday',
);

/** Words that end a hyphenated chunk without being its head: `log-in`, `follow-up`, `opt-out`. */
export const CHUNK_PARTICLES = set(
  'in out up down on off over by to of at as for with away back through around under and or the a an not so go be',
);

/** Determiners that are never pronouns: what stands between one of them and a noun describes the noun. */
export const CERTAIN_DETERMINERS = set('the a an its your our their my his every another no');

/** Verbs that may help another verb or stand by themselves. */
export const FULL_OR_AUXILIARY = set('have has had having do does did doing done');

/** Verbs whose object a bare verb follows: *let the user choose*. */
export const BEFORE_BARE_VERB = set('let lets letting make makes making made help helps helping have has see watch');
