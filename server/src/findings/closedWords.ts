// Closed classes of English words that tell what the word beside them is. From memory; grammar, no single source.

const words = (list: string): ReadonlySet<string> => new Set(list.split(' '));

/** Before a noun. */
export const DETERMINERS = words(
  'a an the this these those my your his her its our their each every any some no another whose many few several both',
);

/** After a transitive verb: what begins its object. */
export const OBJECT_STARTS = words(
  'a an the this these those my your his her its our their each every any some no another all both it them us you me',
);

/** Before the base form of a verb. */
export const BEFORE_BASE_VERB = words(
  "will would can could may might must shall should do does did don't doesn't didn't cannot can't won't let's please i you we they who not never",
);

/** Before the third person of a verb. */
export const BEFORE_THIRD_PERSON = words('he she it who which');

/** Words after which *to* is a preposition: *prior to launch*. */
export const PREPOSITIONAL_TO = words(
  'prior due access compared related subject close next according up specific similar respect thanks',
);

/** Before a noun phrase. */
export const PREPOSITIONS = words(
  'of for in on at with by from after before during since until via per without about into onto between through under over upon within against across as to than like',
);

/** Forms of *be* and *get*, which a participle follows. */
export const BE_FORMS = words("is are was were be been being am isn't aren't wasn't weren't get gets got getting");

/** May stand between an auxiliary and its verb, or between subject and auxiliary. */
export const AUXILIARIES = words(
  "will would can could may might must shall should has have had not also never always already then now still often only just that which who cannot can't won't",
);

/** What may follow an object that ends its noun phrase: a function word, so that the object is not half of a longer name. */
export const AFTER_OBJECT = words(
  'and or but nor so then if when while where unless until because as than that which who whose with without from for to in on at by of into onto via ' +
    'using through before after during within under over again once twice now manually automatically immediately instead first later here there is are was ' +
    'were has have had will would can could may must should does do did not also only a an the this these your its their it they you we per each every',
);
