// Words of general English that name no concept of a field: a choice between two of them is one of style.

const words = (text: string): ReadonlySet<string> => new Set(text.split(/\s+/));

/** Nouns that stand for what another sentence says, after the idea of shell nouns (Schmid 2000); written from memory. */
const NOUNS = words(
  `ability account activity addition advantage advice aim alternative amount answer approach aspect assumption attempt
  background basis beginning behavior benefit bit case cause challenge chance change choice circumstance combination
  concept concern conclusion condition consideration context control course capability decision degree description detail
  difference difficulty discussion drawback effect effort element end example expectation experience explanation extent fact
  factor fashion feature feedback final form function functionality future goal group guidance guideline hand help hint idea
  impact importance improvement individual information instance instruction intent intention introduction issue item kind
  knowledge lack level limitation limit line list look lot manner matter mean meaning means measure mechanism method middle
  minute mistake moment need notion number objective occasion offer offering opinion opportunity option order outcome
  outline overview part people period person phase piece place plan point possibility potential practice preference
  prerequisite pro con probability problem procedure process progress proposal provision purpose quality question reason
  recommendation regard relation relationship requirement respect responsibility rest restriction result review right risk
  role rule sake sample scenario section sense series set share side sign significance similarity situation solution sort
  specific stage standard start state statement step strategy structure style subject suggestion summary support technique
  tendency term thing thought time tip topic trade-off type understanding update usage use user value variant variation
  variety version view way while whole will word work world year constraint component
  call consumption data document documentation frame guide release request site utilization website`,
);

/** Verbs that say of any object that it is there, is used, is shown or is spoken of. */
const VERBS = words(
  `use utilize employ leverage need require want wish see refer consult view look provide supply give offer allow permit let
  enable contain include hold have comprise involve make do take keep retain maintain help assist aid describe explain cover
  discuss mention note know understand learn think consider mean indicate denote represent show demonstrate illustrate say
  tell ask try attempt choose pick prefer like follow find notice observe think believe expect assume ensure guarantee
  determine decide become remain stay come go bring put change modify alter adjust improve enhance increase reduce affect
  influence cause produce yield result face encounter experience meet address handle solve tackle support come happen occur
  appear seem look set specify define configure name add avoid prevent perform get do`,
);

/** True for a noun, in its singular, that names no concept of a field by itself. */
export function isGeneralNoun(noun: string): boolean {
  return NOUNS.has(noun);
}

/** True for a verb, in its base form, that names no operation of a field by itself. */
export function isGeneralVerb(verb: string): boolean {
  return VERBS.has(verb);
}
