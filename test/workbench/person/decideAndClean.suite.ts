// A writer reads a page, replaces a deprecated term, and answers a question: what is seen and clicked, in both themes.
import assert from 'node:assert/strict';
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { until } from '../until.js';
import { termbase } from '../workspace.js';
import { openWindow, type Window } from './stage.js';

for (const theme of ['Default Light Modern', 'Default Dark Modern']) {
  const picture = (name: string): string => `${name}-${theme.toLowerCase().replaceAll(' ', '-')}`;

  describe(`a writer in ${theme}`, () => {
    let window: Window;
    before(async () => {
      window = await openWindow({ 'workbench.colorTheme': theme });
    });
    after(() => window.close());
    const onDisk = (name: string): Promise<string> => readFile(path.join(window.workspace, name), 'utf8');

    it('sees a deprecated term marked, and why', async () => {
      const { workbench } = window;
      await workbench.openFile('connecting.md');
      await workbench.squiggles('warning').first().waitFor();
      assert.match(await workbench.hover('API key', /access key/), /deprecated/i);
      await workbench.screenshot(picture('deprecated-term-hover'));
    });

    it('replaces it from the lightbulb', async () => {
      const { workbench } = window;
      await workbench.codeActions('API key', 'Use “access key” here');
      await workbench.screenshot(picture('deprecated-term-fix'));
      await workbench.page.keyboard.press('Escape');
      await workbench.applyCodeAction('API key', 'Use “access key” here');
      await workbench.waitForText('An access key lets');
      await workbench.save();
      assert.match(await onDisk('connecting.md'), /^An access key lets a station/m);
    });

    it('reads the problem in the Problems view', async () => {
      const { workbench } = window;
      const problems = await workbench.problems();
      assert.ok(
        problems.some((name) => /Evenword/.test(name) && /API key/.test(name)),
        problems.join('\n'),
      );
      await workbench.screenshot(picture('problems'));
      await workbench.command('View: Hide Panel');
    });

    it('sees an undecided mix as faint dots, and its evidence', async () => {
      const { workbench } = window;
      await workbench.openFile('installing.md');
      await workbench.squiggles('hint').first().waitFor();
      await workbench.hover('datalogger', /data logger/);
      await workbench.screenshot(picture('mixed-terms-hover'));
    });

    it('answers the question from the lightbulb', async () => {
      const { workbench } = window;
      await workbench.codeActions('datalogger', 'Prefer “data logger”');
      await workbench.screenshot(picture('mixed-terms-answers'));
      await workbench.page.keyboard.press('Escape');
      await workbench.applyCodeAction('datalogger', 'Prefer “data logger”');
      await until('the answer on disk', async () => (await onDisk('termbase.yaml')) !== termbase);
      assert.match(await onDisk('termbase.yaml'), /preferred: data logger/);
      await workbench.squiggles('warning').first().waitFor();
      await workbench.squiggles('hint').first().waitFor({ state: 'detached' });
      await workbench.screenshot(picture('mixed-terms-answered'));
    });
  });
}
