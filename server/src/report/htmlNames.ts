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
    ${total > 0 && uses > 0 && html`<rect ${colour(series)} width="${width(uses / total)}" height="100%" rx="3" />`}
  </svg>`;
}

/** All names' shares in one bar, side by side. */
export function sharesBar(names: readonly { readonly uses: number; readonly series: number }[]): Markup {
  const total = names.reduce((sum, { uses }) => sum + uses, 0);
  let before = 0;
  const parts = names.map(({ uses, series }) => {
    const start = before;
    before += uses;
    return (
      uses > 0 &&
      html`<rect ${colour(series)} x="${width(start / total)}" width="${width(uses / total)}" height="100%" />`
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

/** Which folder uses which name; each name with the number of its colour. */
export function folderTable(
  names: readonly { readonly text: string; readonly series: number }[],
  where: WhereDriftLives | undefined,
): Markup | undefined {
  if (where === undefined) return undefined;
  const rows = where.folders.map(
    ({ folder, uses }) =>
      html`<tr>
        <th scope="row">${folder === '.' ? 'top folder' : folder}</th>
        <td class="bar">${sharesBar(uses.map((count, index) => ({ uses: count, series: names[index]!.series })))}</td>
        ${uses.map((count) => html`<td class="number">${grouped(count)}</td>`)}
      </tr> `,
  );
  const heads = names.map(
    ({ text, series }) =>
      html`<th scope="col" class="number">
        <svg aria-hidden="true" focusable="false"><rect ${colour(series)} width="100%" height="100%" /></svg>${text}
      </th>`,
  );
  return html`<details>
    <summary>Folder by folder</summary>
    <div class="wide" tabindex="0" role="region" aria-label="Uses by folder">
      <table class="folders">
        <thead>
          <tr>
            <th scope="col">Folder</th>
            <td class="bar"></td>
            ${heads}
          </tr>
        </thead>
        <tbody>
          ${rows}
        </tbody>
      </table>
    </div>
  </details> `;
}

function colour(series: number): Markup {
  return html`class="n${Math.min(series, DISTINCT)}"`;
}

function width(share: number): string {
  return `${Math.round(share * 10000) / 100}%`;
}
