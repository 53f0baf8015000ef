// The quick input of the workbench: the command palette, the list of files and the picks that extensions show.
import type { Locator, Page } from 'playwright-core';
import { persist } from './persist.js';

/** The one quick input of a window. */
export class QuickInput {
  private readonly widget: Locator;
  private readonly input: Locator;

  constructor(private readonly page: Page) {
    this.widget = page.locator('.quick-input-widget');
    this.input = this.widget.locator('input[type="text"]');
  }

  /** Presses `key` until the input shows; a key pressed before the workbench listens is lost. */
  async open(key: string): Promise<void> {
    await persist(5, async () => {
      await this.page.keyboard.press(key);
      await this.input.waitFor({ timeout: 5000 });
    });
  }

  /** Types `text`, waits until a row with `row` in it has the focus, and takes it. */
  async pick(text: string, row = text): Promise<void> {
    await this.input.waitFor();
    await this.input.fill(text);
    await this.widget.locator('.monaco-list-row.focused', { hasText: row }).first().waitFor();
    await this.page.keyboard.press('Enter');
    // A command may put its own question into the same widget, so it need not hide.
    await this.widget.waitFor({ state: 'hidden', timeout: 1000 }).catch(() => undefined);
  }
}
