// Elements that open in one block of Markdown and close in another: what they make of the blocks between.
import { writtenTag } from '../../text/language.js';
import type { BlockContent, ProseBlock } from '../prose.js';
import { ADMONITION_CLASSES, SAFETY_CLASSES } from '../markup/htmlElements.js';
import { Zone, type ZoneSet } from '../zones.js';

/** What an element does to the blocks in it. */
export interface Effect {
  readonly zones: ZoneSet;
  readonly language: string | undefined;
}

/** A start or end tag between blocks. */
export interface Step {
  /** How many blocks of its unit stand before it. */
  readonly at: number;
  readonly name: string;
  readonly opens: boolean;
  readonly effect: Effect | undefined;
}

const SAFETY = /^(?:danger|warning|caution|notice)$/i;
const ADMONITION = /^(?:admonition|callout|alert|aside|banner|hint|note|message|infobox|notice)$/i;
const KIND_ATTRIBUTES = ['type', 'kind', 'variant', 'severity', 'status', 'level', 'intent'];
const CODE = /^(?:pre|code|samp|script|style|svg|math|template|textarea|noscript)$/;
/** Components of MDX whose children are code or drawings. */
const CODE_COMPONENT =
  /^(?:Inline)?(?:Code|CodeBlock|CodeSnippet|Pre|Math|Tex|Mermaid|Diagram|Terminal|Script|Style|Snippet)$/;

/** True for components of MDX whose children, attributes included, are no prose. */
export function holdsCode(name: string): boolean {
  return CODE.test(name) || CODE_COMPONENT.test(name);
}

/**
 * What an element does to the Markdown in it, by its name and attributes; undefined where it does nothing.
 * @param component true where names with a capital are components of MDX.
 */
export function effectOf(
  name: string,
  attribute: (name: string) => string | undefined,
  component: boolean,
): Effect | undefined {
  const lang = attribute('lang');
  const language = lang === undefined ? undefined : writtenTag(lang);
  let zones: ZoneSet = 0;
  if (isSafety(name, attribute, component)) zones |= Zone.safetyMessage;
  if (name === 'blockquote' || name === 'q' || (component && name === 'Quote')) zones |= Zone.quotation;
  if (component ? holdsCode(name) : CODE.test(name)) zones |= Zone.code;
  return zones === 0 && language === undefined ? undefined : { zones, language };
}

function isSafety(name: string, attribute: (name: string) => string | undefined, component: boolean): boolean {
  if (component && /^[A-Z]/.test(name)) {
    if (SAFETY.test(name)) return attribute('type') === undefined || SAFETY.test(attribute('type')!);
    if (ADMONITION.test(name)) return KIND_ATTRIBUTES.some((kind) => SAFETY.test(attribute(kind) ?? ''));
  }
  const written = attribute('class') ?? (component ? attribute('className') : undefined);
  if (written === undefined) return false;
  const classes = written.toLowerCase().split(/\s+/);
  const isNotice = classes.includes('notice') && classes.some((word) => ADMONITION_CLASSES.has(word));
  return isNotice || classes.some((word) => SAFETY_CLASSES.has(word));
}

/**
 * Puts the elements' effects on the blocks in them, by new objects in `blocks`; the steps' `at` count these. An element that
 * nothing closes has no effect.
 */
export function wrap(blocks: ProseBlock[], steps: readonly Step[]): void {
  if (!steps.some(({ effect }) => effect !== undefined)) return;
  const ends = endsOf(steps);
  const around: { readonly to: number; readonly effect: Effect }[] = [];
  let at = 0;
  const passTo = (end: number): void => {
    for (; at < end; at++) {
      while (around.length > 0 && around.at(-1)!.to <= at) around.pop();
      const inner = around.at(-1);
      if (inner) blocks[at] = within(blocks[at]!, inner.effect);
    }
  };
  for (const step of steps) {
    const to = ends.get(step);
    if (to === undefined || to <= step.at) continue;
    passTo(step.at);
    while (around.length > 0 && around.at(-1)!.to <= at) around.pop();
    around.push({ to, effect: both(step.effect!, around.at(-1)?.effect) });
  }
  passTo(blocks.length);
}

/** Of each opening step with an effect that another closes, how many blocks stand before that one. */
function endsOf(steps: readonly Step[]): ReadonlyMap<Step, number> {
  const ends = new Map<Step, number>();
  const open: Step[] = [];
  const openBy = new Map<string, number>();
  for (const step of steps) {
    const { name } = step;
    const count = openBy.get(name) ?? 0;
    if (step.opens) {
      open.push(step);
      openBy.set(name, count + 1);
    } else if (count > 0) {
      let last = open.pop()!;
      for (; last.name !== name; last = open.pop()!) openBy.set(last.name, openBy.get(last.name)! - 1);
      openBy.set(name, count - 1);
      if (last.effect) ends.set(last, step.at);
    }
  }
  return ends;
}

/** The effect of an element together with that of those around it. */
function both(inner: Effect, outer: Effect | undefined): Effect {
  if (!outer) return inner;
  return { zones: inner.zones | outer.zones, language: inner.language ?? outer.language };
}

/** Contents by what they were made of, so that what an edit leaves alone stays the same object. */
const made = new WeakMap<BlockContent, BlockContent>();

function within(block: ProseBlock, effect: Effect): ProseBlock {
  const { content } = block;
  const zones = content.zones | effect.zones;
  const language = content.language ?? effect.language;
  if (zones === content.zones && language === content.language) return block;
  let result = made.get(content);
  if (result?.zones !== zones || result.language !== language) {
    result = { ...content, zones, language };
    made.set(content, result);
  }
  return { ...block, content: result };
}
