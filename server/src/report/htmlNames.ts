// Names in the report's HTML: bars of their shares, the drift sentence, and folders side by side.
import type { Drift, WhereDriftLives } from './drift.js';
import { html } from './markup.js';
import type { Markup } from './markup.js';
import { grouped, percent, whereText } from './words.js';

/** From this name on all look alike. */
const DISTINCT = 3;

/** One horizontal bar that shows a share of a whole. It repeats what the table says in figures, so it is hidden from readers aloud. */
export function shareBar(uses: number, total: number, series: number): Markup {
  return html`<svg aria-hidden="true" focusable="false">
    <rect class="track" width="100%" height="100%" rx="3" />
    ${
      total > 0 &&
      uses > 0 &&
      html`<rect class="n${Math.min(series, DISTINCT)}" width="${width(uses / total)}" height="100%" rx="3" />`
    }
  </svg>`;
}

/** All names' shares in one bar, side by side. */
export function sharesBar(uses: readonly number[]): Markup {
  const total = uses.reduce((sum, count) => sum + count, 0);
  let from = 0;
  const parts = uses.map((count, series) => {
    const start = from;
    from += total === 0 ? 0 : count / total;
    return (
      count > 0 &&
      html`<rect
        class="n${Math.min(series, DISTINCT)}"
        x="${width(start)}"
        width="${width(count / total)}"
        height="100%"
      />`
    );
  });
  return html`<svg aria-hidden="true" focusable="false">${parts}</svg>`;
}

/** A share as a per cent, for the reader. */
export function shareText(uses: number, total: number): string {
  return total === 0 ? '–' : percent(uses / total);
}

/** How mixed the naming is, and where. */
export function driftLine(drift: Drift | undefined, where: WhereDriftLives | undefined): Markup | undefined {
  if (drift === undefined) return undefined;
  const { bits, names } = drift;
  const text =
    bits < 0.005
      ? html`Goes by <strong>one name</strong>.`
      : html`Goes by <strong>${names.toFixed(1)} names in effect</strong>
          <span class="faint">(${bits.toFixed(2)} bits)</span>.`;
  return html`<p class="drift">${text}${where && html` ${whereText(where)}`}</p>`;
}

/** Which folder uses which name. */
export function folderTable(names: readonly string[], where: WhereDriftLives | undefined): Markup | undefined {
  if (where === undefined) return undefined;
  const rows = where.folders.map(
    ({ folder, uses }) =>
      html`<tr>
        <th scope="row">${folder === '.' ? 'top folder' : folder}</th>
        <td class="bar">${sharesBar(uses)}</td>
        ${uses.map((count) => html`<td class="number">${grouped(count)}</td>`)}
      </tr> `,
  );
  return html`<details>
    <summary>Folder by folder</summary>
    <div class="wide" tabindex="0" role="region" aria-label="Uses by folder">
      <table>
        <thead>
          <tr>
            <th scope="col">Folder</th>
            <td></td>
            ${names.map((name) => html`<th scope="col" class="number">${name}</th>`)}
          </tr>
        </thead>
        <tbody>
          ${rows}
        </tbody>
      </table>
    </div>
  </details> `;
}

function width(share: number): string {
  return `${Math.round(share * 10000) / 100}%`;
}
