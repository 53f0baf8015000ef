// What client and server say to each other beyond the Language Server Protocol: plain data and names alone.

/** Languages (VS Code's identifiers) whose documents the server is sent. */
export const DOCUMENT_LANGUAGES = [
  'markdown',
  'mdx',
  'html',
  'xml',
  'dita',
  'docbook',
  'plaintext',
  'restructuredtext',
  'asciidoc',
  'latex',
  'tex',
  'yaml',
  'json',
  'jsonc',
] as const;

/** The file name of a termbase. */
export const TERMBASE_NAME = 'termbase.yaml';

/** Files whose changes on disk the client reports. */
export const WATCHED_FILES = [
  '**/*.{md,markdown,mdx,html,htm,xhtml,xml,dita,page,dbk,txt,text,rst,rest,adoc,asciidoc,asc}',
  '**/*.{ipynb,tex,latex,yaml,yml,json}',
  `**/${TERMBASE_NAME}`,
] as const;

/** Command of a code action after a termbase was edited: the client saves the file, so that the answer is kept. */
export const SAVE_TERMBASE_COMMAND = 'evenword.saveTermbase';

/** What the client tells the server at the start. */
export interface ClientOptions {
  /** True where the client knows {@link SAVE_TERMBASE_COMMAND}. */
  readonly savesTermbase?: boolean;
  /** Whether the user trusts the workspace; not where it is left out. */
  readonly trust?: TrustParams;
}

/** Notification `evenword/trust`: the user has come to trust the workspace. */
export const TRUST_NOTIFICATION = 'evenword/trust';
export interface TrustParams {
  /** True where programs of this computer may read what the folders hold. */
  readonly trusted: boolean;
  /** A path of the server's computer, outside all folders, where what was read of their history is kept. */
  readonly cacheFolder?: string;
}

/** Settings of a workspace folder, as `workspace/configuration` gives section `evenword`. */
export interface FolderSettings {
  readonly hints?: { readonly mixedTerms?: boolean; readonly oddCompanions?: boolean };
  readonly questions?: { readonly leastConfidence?: number };
  readonly history?: boolean;
  readonly read?: { readonly changeLogs?: boolean; readonly zones?: Readonly<Record<string, boolean>> };
}

/** Request `evenword/report`: the terminology report of a workspace folder. */
export const REPORT_REQUEST = 'evenword/report';
export interface ReportParams {
  /** A URI in the folder; the first folder where it is left out. */
  readonly uri?: string;
}
export interface ReportResult {
  /** Texts by file name: `report.html`, `report.md`, `report.json`. */
  readonly files: Readonly<Record<string, string>>;
  readonly openQuestions: number;
}

/** Request `evenword/survey`: reads a workspace folder again; answered when its questions are settled. */
export const SURVEY_REQUEST = 'evenword/survey';
export interface SurveyParams {
  /** A URI in the folder. */
  readonly uri: string;
}

/** Notification `evenword/state`: what the status item shows. */
export const STATE_NOTIFICATION = 'evenword/state';
export interface FolderStateParams {
  readonly folder: string;
  /**
   * `surveying` while documents are read and compared; `ready` with settled questions; `failed` with a message; `ended`
   * where the folder has left the workspace.
   */
  readonly state: 'surveying' | 'ready' | 'failed' | 'ended';
  readonly documents: number;
  readonly openQuestions: number;
  readonly message?: string;
}
