// evenword report: the state of a documentation set's wording, written as files to keep and to forward.
import { makeReport } from '../report/report.js';
import { FILE_OPTIONS, MINING_OPTIONS, surveyOrStop } from './common.js';
import { Exit } from './host.js';
import type { Subcommand } from './subcommand.js';
import { UsageError } from './options.js';

export const report: Subcommand = {
  summary: 'writes report.html, report.md and report.json: the state, open questions, decided concepts',
  operands: 'DIR… --out FOLDER',
  options: {
    out: { value: 'FOLDER', help: 'where to write, made where it is missing; has to be given' },
    ...FILE_OPTIONS,
    ...MINING_OPTIONS,
  },
  async run(given, host) {
    const out = given.options.get('out');
    if (typeof out !== 'string' || out === '') {
      throw new UsageError('Say where to write the report: evenword report DIR --out FOLDER.');
    }
    const survey = await surveyOrStop(host, given, true);
    if (survey === undefined) return Exit.cannotRun;
    const files = makeReport(survey.snapshot, survey.rootUri, { generatedAt: host.now() });
    await host.writeFiles(out, files);
    for (const name of files.keys()) host.note(`wrote ${out.replace(/[\\/]+$/, '')}/${name}\n`);
    return Exit.clean;
  },
};
