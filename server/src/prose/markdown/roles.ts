// What each kind of syntax node means to the reader, looked up by the node type's number.
import { mdxParser } from './grammar.js';

/** The reader's view of a syntax node. */
export const Role = {
  /** No prose in it; it vanishes from the text. */
  none: 0,
  /** Holds blocks. */
  container: 1,
  listItem: 2,
  blockquote: 3,
  admonition: 4,
  paragraph: 5,
  heading: 6,
  title: 7,
  table: 8,
  tableCell: 9,
  definition: 10,
  tooDeep: 11,
  /** Inline markup whose content is text. */
  styled: 12,
  link: 13,
  image: 14,
  /** Inline matter that one opaque unit stands for. */
  opaque: 15,
  escape: 16,
  reference: 17,
  lineBreak: 18,
  htmlTag: 19,
  linkMark: 20,
  linkLabel: 21,
  url: 22,
  htmlBlock: 23,
  definedTerm: 24,
  definitionBody: 25,
  unended: 26,
  mdxFlow: 27,
  brokenMdx: 28,
  jsxTag: 29,
  expression: 30,
  brokenInline: 31,
  list: 32,
  fence: 33,
  templateTag: 34,
} as const;

const NAMES: Record<string, number> = {
  Document: Role.container,
  BulletList: Role.list,
  OrderedList: Role.list,
  Footnote: Role.container,
  ListItem: Role.listItem,
  Blockquote: Role.blockquote,
  IndentedContainer: Role.admonition,
  ColonContainer: Role.admonition,
  Paragraph: Role.paragraph,
  Task: Role.paragraph,
  SetextHeading1: Role.heading,
  SetextHeading2: Role.heading,
  ContainerTitle: Role.title,
  Table: Role.table,
  TableHeader: Role.table,
  TableRow: Role.table,
  TableCell: Role.tableCell,
  LinkReference: Role.definition,
  TooDeep: Role.tooDeep,
  FencedCode: Role.fence,
  TemplateTag: Role.templateTag,
  HTMLBlock: Role.htmlBlock,
  LongHtml: Role.htmlBlock,
  DefinedTerms: Role.container,
  DefinedTerm: Role.definedTerm,
  Definition: Role.definitionBody,
  UnendedTemplate: Role.unended,
  MdxFlow: Role.mdxFlow,
  BrokenMdx: Role.brokenMdx,
  JsxTag: Role.jsxTag,
  MdxExpression: Role.expression,
  BrokenInline: Role.brokenInline,
  Emphasis: Role.styled,
  StrongEmphasis: Role.styled,
  Strikethrough: Role.styled,
  Link: Role.link,
  Image: Role.image,
  InlineCode: Role.opaque,
  Autolink: Role.opaque,
  Template: Role.opaque,
  Emoji: Role.opaque,
  BareUrl: Role.opaque,
  Escape: Role.escape,
  Entity: Role.reference,
  HardBreak: Role.lineBreak,
  HTMLTag: Role.htmlTag,
  LinkMark: Role.linkMark,
  LinkLabel: Role.linkLabel,
  URL: Role.url,
};

// MDX has every type of node that Markdown has, by the same number.
const types = mdxParser.nodeSet.types;

/** Node type id → {@link Role}. */
export const ROLE_OF = Uint8Array.from(types, ({ name }) =>
  name.startsWith('ATXHeading') ? Role.heading : (NAMES[name] ?? Role.none),
);

/** Node type id → heading level, else 0. */
export const LEVEL_OF = Uint8Array.from(types, ({ name }) => (/Heading\d$/.test(name) ? Number(name.slice(-1)) : 0));
