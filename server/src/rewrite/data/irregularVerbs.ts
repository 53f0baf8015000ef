// Irregular English verbs: base, past, past participle; alternatives by a slash, the usual one first. Facts of English, from memory.

/** Base form → its past forms and its participle forms, the usual one of documentation first. */
export const IRREGULAR_VERBS: ReadonlyMap<
  string,
  { readonly past: readonly string[]; readonly participle: readonly string[] }
> = new Map(
  (
    'be was/were been|have had had|do did done|go went gone|arise arose arisen|awake awoke awoken|bear bore borne/born|beat beat beaten|' +
    'become became become|befall befell befallen|beget begot begotten|begin began begun|behold beheld beheld|bend bent bent|beset beset beset|bet bet bet|' +
    'bid bid bid/bidden|bind bound bound|bite bit bitten|bleed bled bled|blow blew blown|break broke broken|breed bred bred|' +
    'bring brought brought|broadcast broadcast broadcast|build built built|burn burned/burnt burned/burnt|burst burst burst|buy bought bought|' +
    'cast cast cast|catch caught caught|choose chose chosen|cling clung clung|come came come|cost cost cost|creep crept crept|' +
    'cut cut cut|deal dealt dealt|dig dug dug|dive dived/dove dived|draw drew drawn|dream dreamed/dreamt dreamed/dreamt|drink drank drunk|drive drove driven|' +
    'dwell dwelt/dwelled dwelt/dwelled|eat ate eaten|fall fell fallen|feed fed fed|feel felt felt|fight fought fought|find found found|fit fit/fitted fit/fitted|' +
    'flee fled fled|fling flung flung|fly flew flown|forbid forbade/forbad forbidden|forecast forecast/forecasted forecast/forecasted|' +
    'forget forgot forgotten|forgive forgave forgiven|forsake forsook forsaken|freeze froze frozen|get got gotten/got|give gave given|grind ground ground|' +
    'grow grew grown|hang hung/hanged hung/hanged|hear heard heard|hide hid hidden/hid|hit hit hit|hold held held|hurt hurt hurt|keep kept kept|' +
    'kneel knelt/kneeled knelt/kneeled|knit knit/knitted knit/knitted|know knew known|lay laid laid|lead led led|lean leaned/leant leaned/leant|leap leaped/leapt leaped/leapt|' +
    'learn learned/learnt learned/learnt|leave left left|lend lent lent|let let let|lie lay lain|light lit/lighted lit/lighted|' +
    'lose lost lost|make made made|mean meant meant|meet met met|mow mowed mown/mowed|partake partook partaken|pay paid paid|plead pleaded/pled pleaded/pled|prove proved proven/proved|put put put|' +
    'quit quit/quitted quit/quitted|read read read|rend rent rent|rid rid rid|ride rode ridden|ring rang rung|rise rose risen|run ran run|' +
    'saw sawed sawn/sawed|say said said|see saw seen|seek sought sought|sell sold sold|send sent sent|set set set|sew sewed sewn/sewed|shake shook shaken|' +
    'shear sheared shorn/sheared|shed shed shed|shine shone/shined shone/shined|shoot shot shot|show showed shown/showed|shrink shrank/shrunk shrunk/shrunken|' +
    'shut shut shut|sing sang sung|sink sank/sunk sunk/sunken|sit sat sat|sleep slept slept|slide slid slid|sling slung slung|slit slit slit|' +
    'smell smelled/smelt smelled/smelt|sow sowed sown/sowed|speak spoke spoken|speed sped/speeded sped/speeded|spell spelled/spelt spelled/spelt|' +
    'spend spent spent|spill spilled/spilt spilled/spilt|spin spun spun|spit spat/spit spat/spit|split split split|spoil spoiled/spoilt spoiled/spoilt|' +
    'spread spread spread|spring sprang/sprung sprung|stand stood stood|steal stole stolen|stick stuck stuck|sting stung stung|' +
    'stink stank/stunk stunk|stride strode stridden|strike struck struck/stricken|string strung strung|strive strove/strived striven/strived|' +
    'swear swore sworn|sweep swept swept|swell swelled swollen/swelled|swim swam swum|swing swung swung|take took taken|' +
    'teach taught taught|tear tore torn|tell told told|think thought thought|thrive thrived/throve thrived/thriven|throw threw thrown|thrust thrust thrust|' +
    'tread trod trodden/trod|understand understood understood|undergo underwent undergone|undertake undertook undertaken|upset upset upset|offset offset offset|' +
    'wake woke woken|wear wore worn|weave wove woven|wed wed/wedded wed/wedded|weep wept wept|wet wet/wetted wet/wetted|win won won|' +
    'wind wound wound|withdraw withdrew withdrawn|withhold withheld withheld|withstand withstood withstood|wring wrung wrung|' +
    'write wrote written|input input/inputted input/inputted|output output/outputted output/outputted|proofread proofread proofread|' +
    'typeset typeset typeset|preset preset preset|inset inset inset|telecast telecast telecast|simulcast simulcast simulcast|' +
    'browbeat browbeat browbeaten|ghostwrite ghostwrote ghostwritten|babysit babysat babysat|dedup deduped deduped|' +
    'troubleshoot troubleshot troubleshot|overlay overlaid overlaid|inlay inlaid inlaid|backbite backbit backbitten|bus bused/bussed bused/bussed'
  )
    .split('|')
    .map((entry) => {
      const [base, past, participle] = entry.split(' ') as [string, string, string];
      return [base, { past: past.split('/'), participle: participle.split('/') }];
    }),
);

/** Regular verbs that look like a prefix and an irregular verb. */
export const REGULAR_DESPITE_PREFIX: ReadonlySet<string> = new Set('relay delay belay debit'.split(' '));

/** Verbs of several syllables with the stress on the last, whose final consonant doubles. */
export const STRESSED_LAST: ReadonlySet<string> = new Set(
  (
    'abet abhor abut acquit admit allot annul aver befit begin commit compel concur confer control cosset defer demur deter disbar ' +
    'dispel embed emit enrol enthral entrap equip excel expel extol forbid forget impel incur infer inter instil intermit monogram ' +
    'occur omit outfit patrol permit prefer program propel rebel rebut recap recur refer regret remit repel submit transfer transmit ' +
    'unfit upset handicap kidnap format hobnob zigzag humbug input output'
  ).split(' '),
);

/** Last parts of compounds written as one word, whose final consonant doubles: bootstrap, snapshot, hotplug, backlog. */
export const DOUBLING_ENDINGS: readonly string[] =
  'strap drop plug swap shot step stop hop snap wrap tag zip map plot spot slot chat chop clip trim scan spin pin run cut set put get sit fit shut quit hit log jog dog tap skip slip ship trip strip whip flag bug ban bid'.split(
    ' ',
  );

/** Verbs that end like one of those and still do not double, or whose prefix is none. */
export const NEVER_DOUBLING: ReadonlySet<string> = new Set(
  (
    'catalog dialog debit credit edit audit limit delimit exit visit orbit profit benefit budget target market inherit inhibit exhibit prohibit ' +
    'deposit posit solicit elicit merit spirit rivet ricochet trumpet pivot ballot develop envelop gallop gossip worship fillet interpret ' +
    'carpet covet closet docket racket socket ticket bucket packet blanket junket billet bullet bonnet comet pilot vomit exploit'
  ).split(' '),
);
