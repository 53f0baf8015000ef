// The small documentation set that the workbench tests run on: one decided mix, one undecided mix, one page in order.
import { mkdir, writeFile } from 'node:fs/promises';
import path from 'node:path';

/** The team's decisions. The tests see that an answer keeps every line of it, comments too. */
export const termbase = `# What the documentation team has decided.
evenword: 1
concepts:
  - preferred: access key # not the key of a lock
    deprecated: [API key]
`;

/** A page that uses the deprecated term: twice in prose, and in two zones where nothing is checked. */
export const decidedPage = `# Connecting a station

An API key lets a station send its readings to the archive. Store the API key where
only the station can read it. The header is called \`API key\` in the code:

    API key = read_key()

Without an access key the archive refuses every reading.
`;

/** The page that the undecided mix is asked on; both names stand in the same kinds of places. */
export const mixedPage = `# The data logger

The data logger keeps the readings of one month. Connect the data logger to the mast
before you close the hull. A data logger that loses power keeps its clock for a week.
Check the data logger after every storm.
`;

/** Files by their paths in the workspace. */
export const files: Readonly<Record<string, string>> = {
  'termbase.yaml': termbase,
  'connecting.md': decidedPage,
  'logger.md': mixedPage,
  'installing.md': `# Installing a station

Mount the datalogger inside the hull. The datalogger has four inputs, one for each sensor.
Seal the datalogger with a new gasket. Then connect the data logger to the antenna.
`,
  'service.md': `# Service visit

Open the hull and take the datalogger out. If the datalogger is wet, dry it for a day.
Replace the battery of the datalogger every second year. Write the number of the
data logger into the log book.
`,
  'faults.md': `# Faults

When a datalogger stops, the station sends no reading. Restart the datalogger with the
magnet. A datalogger that stops twice in a month is sent back to the workshop.
The workshop opens the data logger and reads its memory.
`,
  'quiet.md': `# Names

Give every station a short name. The name stands on the hull and in the archive.
`,
};

/** Writes the files into `folder`, which it makes. */
export async function writeWorkspace(folder: string): Promise<void> {
  for (const [name, text] of Object.entries(files)) {
    const file = path.join(folder, name);
    await mkdir(path.dirname(file), { recursive: true });
    await writeFile(file, text);
  }
}
