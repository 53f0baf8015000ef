// The elements of DITA 1.3 (OASIS) as the reader sees them; those of other specialisations are read as unknown ones.
import * as role from './roles.js';

const NOTE: role.ElementRole = { flow: role.Flow.block, zones: 0, safetyBy: 'type' };
const DRAFT = 'draft-comment required-cleanup';

const ELEMENTS: readonly role.RoleLine[] = [
  [role.SECTION, 'dita topic concept task reference glossentry glossgroup troubleshooting generalTask machineryTask'],
  [role.SECTION, 'learningOverview learningContent learningSummary learningAssessment learningPlan section example'],
  [role.SECTION, 'refsyn prereq context result postreq tasktroubleshooting condition cause remedy'],
  [role.CONTAINER, 'body conbody taskbody refbody bodydiv sectiondiv troublebody troubleSolution glossBody abstract'],
  [role.CONTAINER, 'steps steps-unordered substeps choices ul ol sl dl dlentry dlhead parml plentry p-list div'],
  [
    role.CONTAINER,
    'tgroup thead tbody row sthead strow properties property prophead choicetable chhead chrow figgroup',
  ],
  [role.CONTAINER, 'titlealts related-links linkpool imagemap messagepanel'],
  [role.CAPTIONED, 'fig table simpletable linklist'],
  [role.TITLE, 'title'],
  [role.OTHER_TITLE, 'navtitle searchtitle'],
  [
    role.PARAGRAPH,
    'p shortdesc lines desc info stepresult stepxmp steptroubleshooting tutorialinfo linkinfo stepsection',
  ],
  [role.PARAGRAPH, 'glossUsage glossScopeNote responsibleParty itemgroup'],
  [role.LIST_PART, 'step substep'],
  [role.LIST_ITEM, 'li sli choice cmd'],
  [role.DEFINED_TERM, 'dt'],
  [role.HEADWORD, 'glossterm'],
  [role.ALSO_CALLED, 'glossSurfaceForm glossAcronym glossAbbreviation glossShortForm glossSynonym'],
  [role.DEFINITION, 'dd pd'],
  [{ ...role.DEFINITION, glossary: 'definition' }, 'glossdef'],
  [role.CELL, 'entry stentry propdesc propvalue propdeschd propvaluehd proptypehd choptionhd chdeschd choption chdesc'],
  [role.CELL, 'dthd ddhd'],
  [NOTE, 'note'],
  [role.SAFETY, 'hazardstatement'],
  [role.PARAGRAPH, 'typeofhazard consequence howtoavoid'],
  [role.QUOTATION, 'lq'],
  [role.ASIDE, 'fn xref>desc link>desc'],
  [role.ALTERNATIVE, 'alt'],
  [role.PICTURE, 'image hazardsymbol object'],
  [role.METADATA, 'prolog metadata topicmeta'],
  // Parameter names, types of properties: code by nature.
  [
    role.CLOSED,
    'codeblock msgblock screen pre syntaxdiagram pt proptype map bookmap subjectScheme topicref topicgroup',
  ],
  [role.CLOSED, 'coords shape longquoteref data-about foreign unknown svg mathml equation-block equation-figure'],
  [role.CLOSED, `${DRAFT} coderef include`],
  [role.HIDDEN, 'indexterm index-see index-see-also index-sort-as data longdescref boolean state'],
  [role.HIDDEN, 'sort-as indextermref anchor param'],
  [
    role.OPAQUE_INLINE,
    'codeph filepath cmdname varname parmname option apiname userinput systemoutput msgnum kwd var oper',
  ],
  [
    role.OPAQUE_INLINE,
    'delim sep synph synnote tt xmlelement xmlatt textentity parameterentity numcharref xmlnsname xmlpi',
  ],
  [role.OPAQUE_INLINE, 'markupname abbreviated-form equation-inline sup line-through'],
  [role.UI_LABEL, 'uicontrol wintitle shortcut msgph'],
  [role.UI_PATH, 'menucascade'],
  [role.TERM, 'term'],
  [role.QUOTE, 'q cite'],
  [role.NAME, 'tm'],
  [role.link('href', 'keyref'), 'xref'],
  [{ ...role.PARAGRAPH, targets: ['href', 'keyref'] }, 'link'],
  [role.INLINE, 'ph keyword b i u sub text linktext overline'],
];

export const DITA = role.vocabulary('dita', ELEMENTS, { 'image@alt': 'alternativeText', spectitle: 'caption' }, 'read');

/** Root elements of topics. */
export const DITA_ROOTS = new Set(
  'dita topic concept task reference glossentry glossgroup troubleshooting generalTask machineryTask learningOverview'
    .concat(' learningContent learningSummary learningAssessment learningPlan')
    .split(' '),
);
/** Root elements of maps, which name topics and hold no prose of their own. */
export const DITA_MAPS = new Set('map bookmap subjectScheme learningMap learningBookmap'.split(' '));
