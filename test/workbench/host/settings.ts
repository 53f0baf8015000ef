// The user settings of a test run: nothing pops up, nothing saves by itself, nothing asks the network.
import { existsSync, mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/** User settings by their names in VS Code. */
export type Settings = Readonly<Record<string, unknown>>;

const quiet: Settings = {
  'chat.agent.enabled': false,
  'chat.commandCenter.enabled': false,
  'chat.disableAIFeatures': true,
  'editor.accessibilitySupport': 'off',
  'extensions.autoCheckUpdates': false,
  'extensions.autoUpdate': false,
  'extensions.ignoreRecommendations': true,
  'files.autoSave': 'off',
  'files.hotExit': 'off',
  'git.enabled': false,
  'security.workspace.trust.enabled': false,
  'task.autoDetect': 'off',
  'telemetry.telemetryLevel': 'off',
  'update.mode': 'none',
  'update.showReleaseNotes': false,
  'workbench.enableExperiments': false,
  'workbench.secondarySideBar.defaultVisibility': 'hidden',
  'workbench.startupEditor': 'none',
  'workbench.tips.enabled': false,
  'workbench.welcomePage.walkthroughs.openOnInstall': false,
};

/** Writes the quiet settings, and `more` over them, into a user-data folder that has none yet. */
export function writeUserSettings(userData: string, more: Settings = {}): void {
  const file = path.join(userData, 'User/settings.json');
  if (existsSync(file)) return;
  mkdirSync(path.dirname(file), { recursive: true });
  writeFileSync(file, JSON.stringify({ ...quiet, ...more }, null, 2));
}
