// Finds where a word of the active editor stands on the screen.
import type { Page } from 'playwright-core';

/** A point on the page, in CSS pixels. */
export interface Point {
  readonly x: number;
  readonly y: number;
}

/**
 * The middle of the `nth` (from 0) `word` that the active editor shows; waits until it is there.
 * The editor cuts a line into many elements, so the word is measured as a DOM range over their text nodes.
 */
export async function middleOfWord(page: Page, word: string, nth = 0): Promise<Point> {
  const found = await page.waitForFunction(measure, { word, nth }, { timeout: 30_000 });
  const point = await found.jsonValue();
  if (point === null) throw new Error(`“${word}” is not on the screen`);
  return point;
}

/** Runs in the page. */
function measure({ word, nth }: { word: string; nth: number }): Point | null {
  let left = nth;
  const top = (line: Element): number => line.getBoundingClientRect().top;
  const lines = [...document.querySelectorAll('.editor-group-container.active .view-line')];
  for (const line of lines.sort((a, b) => top(a) - top(b))) {
    const walker = document.createTreeWalker(line, NodeFilter.SHOW_TEXT);
    const starts: { at: number; node: Text }[] = [];
    let text = '';
    while (walker.nextNode()) {
      const node = walker.currentNode as Text;
      starts.push({ at: text.length, node });
      text += node.data.replace(/\u00a0/g, ' ');
    }
    const place = (offset: number): { at: number; node: Text } | undefined =>
      starts.findLast((start) => start.at <= offset);
    for (let i = text.indexOf(word); i >= 0; i = text.indexOf(word, i + 1)) {
      if (left-- > 0) continue;
      const first = place(i);
      const last = place(i + word.length - 1);
      if (first === undefined || last === undefined) continue;
      const range = document.createRange();
      range.setStart(first.node, i - first.at);
      range.setEnd(last.node, i + word.length - last.at);
      const box = range.getBoundingClientRect();
      return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
    }
  }
  return null;
}
