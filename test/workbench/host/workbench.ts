// The workbench as a person uses it: page object over a browser page that shows the packaged VS Code.
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import type { FrameLocator, Locator, Page } from 'playwright-core';
import { screenshotFolder } from './places.js';
import { persist } from './persist.js';
import { QuickInput } from './quickInput.js';
import { workbenchUrl } from './url.js';
import { middleOfWord } from './words.js';

/** Kinds of squiggles, by the severity of their diagnostics. */
export type Squiggle = 'error' | 'warning' | 'info' | 'hint';

/** One workbench window. Every action waits until the screen shows its effect, and throws when it does not come. */
export class Workbench {
  readonly quickInput: QuickInput;

  constructor(
    readonly page: Page,
    private readonly authority: string,
  ) {
    this.quickInput = new QuickInput(page);
  }

  /** Opens a folder and waits for its tree. */
  async open(folder: string, extensionDevelopmentPaths: readonly string[] = []): Promise<void> {
    const url = workbenchUrl({ authority: this.authority, target: folder, extensionDevelopmentPaths });
    await this.page.goto(url, { waitUntil: 'domcontentloaded', timeout: 120_000 });
    await this.page.locator('.monaco-workbench .part.statusbar .statusbar-item').first().waitFor({ timeout: 120_000 });
    await this.page.locator('.explorer-folders-view .monaco-list-row').first().waitFor({ timeout: 120_000 });
  }

  /** Runs a command by its full title in the palette, such as `View: Toggle Word Wrap`. */
  async command(title: string): Promise<void> {
    await this.quickInput.open('F1');
    await this.quickInput.pick(`>${title}`, title);
  }

  /** Opens a file of the workspace by its name and waits for its text. */
  async openFile(name: string): Promise<void> {
    await this.quickInput.open('Control+KeyP');
    await this.quickInput.pick(name);
    await this.page.locator(`.tabs-container .tab[data-resource-name="${name}"].active`).waitFor();
    await this.page.locator('.editor-group-container.active .view-lines .view-line').first().waitFor();
  }

  /** Saves the active file and waits until its tab is clean. */
  async save(): Promise<void> {
    await this.page.keyboard.press('Control+KeyS');
    await this.page.locator('.editor-group-container.active .tab.active:not(.dirty)').first().waitFor();
  }

  /** The lines that the active editor shows, top to bottom. */
  async lines(): Promise<string[]> {
    const shown = this.page.locator('.editor-group-container.active .view-line');
    const placed = await shown.evaluateAll((lines) =>
      lines.map((line) => ({
        top: line.getBoundingClientRect().top,
        text: line.textContent.replace(/\u00a0/g, ' '),
      })),
    );
    return placed.sort((a, b) => a.top - b.top).map((line) => line.text);
  }

  /** Waits until the active editor shows `text` within one line. */
  async waitForText(text: string): Promise<void> {
    await middleOfWord(this.page, text);
  }

  /** The squiggles in the active editor; a hint is drawn as dots. */
  squiggles(kind: Squiggle): Locator {
    return this.page.locator(`.editor-group-container.active .squiggly-${kind}`);
  }

  /** Puts the caret into the `nth` (from 0) `word`. */
  async clickWord(word: string, nth = 0): Promise<void> {
    const point = await middleOfWord(this.page, word, nth);
    await this.page.mouse.click(point.x, point.y);
  }

  /**
   * Rests the mouse on a word until the hover shows `expected`: a first small move is now and then not seen, and the
   * parts of a hover come one after the other. @returns the text of the whole hover.
   */
  async hover(word: string, expected: RegExp, nth = 0): Promise<string> {
    const point = await middleOfWord(this.page, word, nth);
    const shown = this.page.locator('.monaco-hover:not(.hidden)').filter({ hasText: expected }).first();
    return persist(5, async (attempt) => {
      await this.page.mouse.move(5, 5);
      await this.page.mouse.move(point.x - 3 + attempt, point.y, { steps: 3 });
      await shown.waitFor({ timeout: 5000 });
      return (await shown.innerText()).trim();
    });
  }

  /**
   * Opens the lightbulb menu on a word, waits for an entry that has `title` in it, and leaves the menu open.
   * @returns the entries. The menu is not filled anew while it is open, so it is opened again until the entry is there.
   */
  async codeActions(word: string, title: string, nth = 0): Promise<string[]> {
    await this.clickWord(word, nth);
    const rows = this.actionRows();
    await persist(5, async () => {
      await this.page.keyboard.press('Escape');
      await this.page.keyboard.press('Control+.');
      await rows.filter({ hasText: title }).first().waitFor({ timeout: 4000 });
    });
    return rows.allInnerTexts();
  }

  /** Takes an entry of the lightbulb menu on a word. The rows are covered by a pointer block, so the keyboard chooses. */
  async applyCodeAction(word: string, title: string, nth = 0): Promise<void> {
    const entries = await this.codeActions(word, title, nth);
    const steps = entries.findIndex((entry) => entry.includes(title));
    for (let i = 0; i < steps; i++) await this.page.keyboard.press('ArrowDown');
    await this.page.locator('.action-widget .monaco-list-row.action.focused', { hasText: title }).waitFor();
    await this.page.keyboard.press('Enter');
    await this.page.locator('.action-widget').first().waitFor({ state: 'hidden' });
  }

  private actionRows(): Locator {
    return this.page.locator('.action-widget .monaco-list-row.action');
  }

  /** The accessible names of the rows in the Problems view, which it opens. */
  async problems(): Promise<string[]> {
    await this.command('Problems: Focus on Problems View');
    const rows = this.page.locator('.markers-panel .monaco-list-row');
    await rows.first().waitFor();
    return rows.evaluateAll((all) => all.map((row) => row.getAttribute('aria-label') ?? ''));
  }

  /** Opens a container of the activity bar by its title. */
  async openContainer(title: string): Promise<void> {
    await this.page.locator(`.activitybar .action-item [aria-label^="${title}"]`).first().click();
  }

  /** The rows of the trees in the side bar. */
  treeRows(): Locator {
    return this.page.locator('.part.sidebar .pane-body .monaco-list-row');
  }

  /** The document inside the newest webview, which is two frames deep. */
  webview(): FrameLocator {
    return this.page.locator('iframe.webview.ready').last().contentFrame().frameLocator('iframe#active-frame');
  }

  /** Notifications on the screen. */
  notifications(): Locator {
    return this.page.locator('.notification-toast .notification-list-item-message');
  }

  /** Puts a picture of the window into the folder of screenshots. @returns its path. */
  async screenshot(name: string): Promise<string> {
    mkdirSync(screenshotFolder, { recursive: true });
    const file = path.join(screenshotFolder, `${name}.png`);
    await this.page.screenshot({ path: file });
    return file;
  }
}
