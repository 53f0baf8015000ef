// Nouns whose plural no rule gives, and nouns that have none. Facts of English, written from memory.

/** Singular and its plurals; the plural that documentation prefers stands first. */
export const IRREGULAR_NOUNS: readonly (readonly [string, ...string[]])[] = (
  'man men|woman women|child children|person people|foot feet|tooth teeth|goose geese|mouse mice|louse lice|ox oxen|die dice|' +
  'penny pennies pence|passerby passersby|index indexes indices|matrix matrices matrixes|vertex vertices vertexes|' +
  'appendix appendixes appendices|vortex vortices vortexes|codex codices|cortex cortices|helix helices|simplex simplices simplexes|' +
  'criterion criteria|phenomenon phenomena|automaton automata automatons|polyhedron polyhedra|ganglion ganglia|' +
  'datum data|erratum errata|addendum addenda|bacterium bacteria|stratum strata|spectrum spectra spectrums|quantum quanta|' +
  'medium media mediums|memorandum memoranda memorandums|curriculum curricula curriculums|consortium consortia consortiums|' +
  'maximum maximums maxima|minimum minimums minima|optimum optimums optima|extremum extrema|millennium millennia|desideratum desiderata|' +
  'radius radii|nucleus nuclei|locus loci|focus focuses foci|stimulus stimuli|bacillus bacilli|alumnus alumni|fungus fungi|' +
  'cactus cactuses cacti|syllabus syllabuses syllabi|terminus termini terminuses|genus genera|corpus corpora corpuses|opus opuses opera|' +
  'axis axes|basis bases|analysis analyses|crisis crises|thesis theses|hypothesis hypotheses|synthesis syntheses|diagnosis diagnoses|' +
  'prognosis prognoses|parenthesis parentheses|synopsis synopses|emphasis emphases|ellipsis ellipses|oasis oases|' +
  'antithesis antitheses|paralysis paralyses|nemesis nemeses|neurosis neuroses|ephemeris ephemerides|' +
  'alga algae|larva larvae|vertebra vertebrae|alumna alumnae|formula formulas formulae|antenna antennas antennae|nebula nebulas nebulae|' +
  'schema schemas schemata|lemma lemmas lemmata|stigma stigmas stigmata|' +
  'leaf leaves|loaf loaves|half halves|calf calves|shelf shelves|self selves|elf elves|wolf wolves|knife knives|life lives|wife wives|' +
  'thief thieves|sheaf sheaves|scarf scarves scarfs|hoof hooves hoofs|wharf wharves wharfs|' +
  'hero heroes|echo echoes|potato potatoes|tomato tomatoes|veto vetoes|embargo embargoes|torpedo torpedoes|zero zeros zeroes|tornado tornadoes|' +
  'volcano volcanoes|cargo cargoes cargos|buffalo buffalo buffaloes|mosquito mosquitoes|dingo dingoes|' +
  'quiz quizzes|fez fezzes|bus buses busses|gas gases gasses|plus pluses plusses|beau beaus|bureau bureaus bureaux|' +
  'plateau plateaus plateaux|tableau tableaus tableaux'
)
  .split('|')
  .map((entry) => entry.split(' ') as [string, ...string[]]);

/** Nouns that are the same in both numbers, each also usable with *a* (a series, two series). */
export const UNCHANGED_NOUNS: ReadonlySet<string> = new Set(
  (
    'series species means headquarters crossroads chassis aircraft spacecraft hovercraft sheep deer fish moose swine offspring ' +
    'innings barracks gallows corps bison salmon'
  ).split(' '),
);

/** Nouns that are not counted: no plural, and no *a* before them. */
export const UNCOUNTED_NOUNS: ReadonlySet<string> = new Set(
  (
    'software hardware firmware middleware malware ransomware spyware shareware freeware groupware information equipment advice ' +
    'metadata data knowledge traffic bandwidth feedback news machinery furniture homework research evidence luggage baggage music ' +
    'rice money electricity clothing personnel police expertise mail garbage infrastructure connectivity ' +
    'authentication authorization authorisation encryption documentation analytics telemetry storage electronics physics mathematics ' +
    'politics economics statistics logistics ethics graphics progress'
  ).split(' '),
);

/** Nouns that documentation uses in the plural only, so that *a* never goes before them. */
export const PLURAL_ONLY_NOUNS: ReadonlySet<string> = new Set(
  'thanks surroundings earnings regards pants wares premises scissors pliers clothes stairs savings proceedings trousers jeans shears tweezers goggles'.split(
    ' ',
  ),
);
