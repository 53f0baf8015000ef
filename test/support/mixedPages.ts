// A small documentation set with one decided and one undecided mix, for tests of the server and the command line.

/** The decided mix. */
export const TERMBASE = `# Decided by the documentation team.
evenword: 1
concepts:
  - preferred: access key # not the key of a lock
    deprecated: [API key]
`;

/** Pages by file name. */
export const PAGES: Readonly<Record<string, string>> = {
  'connecting.md': `# Connecting a station

An API key lets a station send its readings to the archive. Store the API key where
only the station can read it. The header is called \`API key\` in the code:

    API key = read_key()

Without an access key the archive refuses every reading.
`,
  'logger.md': `# The data logger

The data logger keeps the readings of one month. Connect the data logger to the mast
before you close the hull. A data logger that loses power keeps its clock for a week.
Check the data logger after every storm.
`,
  'installing.md': `# Installing a station

Mount the datalogger inside the hull. The datalogger has four inputs, one for each sensor.
Seal the datalogger with a new gasket. Then connect the data logger to the antenna.
`,
  'service.md': `# Service visit

Open the hull and take the datalogger out. If the datalogger is wet, dry it for a day.
Replace the battery of the datalogger every second year. Write the number of the
data logger into the log book.
`,
  'quiet.md': `# Names

Give every station a short name. The name stands on the hull and in the archive.
`,
};
