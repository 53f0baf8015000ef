// Decided concepts in the report's HTML, and what else the termbase says: terms kept apart, questions put off.
import type { TermStatus } from '../termbase/termbase.js';
import { driftLine, folderTable, shareBar, shareText } from './htmlNames.js';
import { html } from './markup.js';
import type { Markup } from './markup.js';
import type { NamedTogether, ReportConcept, ReportData } from './reportData.js';
import { counted, grouped, listed } from './words.js';

/** Pages with a deprecated term that are shown at once; the rest opens. */
const PAGES_SHOWN = 5;

/** The colours of decided names say their status. */
const SERIES: Readonly<Record<TermStatus, number>> = { preferred: 0, deprecated: 1, admitted: 2 };

/** The part on decided concepts. */
export function conceptsPart({ concepts }: ReportData): Markup {
  const body =
    concepts.length === 0
      ? html`<p>
          Nothing is decided yet. An answer to a question is kept in <code>termbase.yaml</code>, and every page is held
          to it.
        </p>`
      : html`<p>Those with most uses still to change come first.</p>
          ${concepts.map(conceptEntry)}`;
  return html`<section class="part" aria-labelledby="concepts">
    <h2 id="concepts">Decided concepts</h2>
    ${body}
  </section> `;
}

/** The parts on terms kept apart, questions put off and termbases further down; none where there is nothing to say. */
export function otherParts({ apart, later, otherTermbases }: ReportData): Markup {
  return html`${apart.length > 0 && listPart('apart', 'Kept apart', 'These look alike and name different concepts.', apart, 'and')}${
    later.length > 0 && listPart('later', 'Put off', 'These questions rest until their use grows.', later, 'or')
  }${
    otherTermbases.length > 0 &&
    html`<section class="part" aria-labelledby="others">
      <h2 id="others">Folders with decisions of their own</h2>
      <ul class="pairs">
        ${otherTermbases.map(({ path, concepts }) => html`<li>${path}: ${counted(concepts, 'concept')}</li>`)}
      </ul>
    </section> `
  }`;
}

function listPart(
  id: string,
  title: string,
  intro: string,
  entries: readonly NamedTogether[],
  joint: 'and' | 'or',
): Markup {
  return html`<section class="part" aria-labelledby="${id}">
    <h2 id="${id}">${title}</h2>
    <p>${intro}</p>
    <ul class="pairs">
      ${entries.map(
        ({ terms, note }) =>
          html`<li>${listed(terms, joint)}${note !== undefined && html`<span class="faint">: ${note}</span>`}</li> `,
      )}
    </ul>
  </section> `;
}

function conceptEntry(concept: ReportConcept, index: number): Markup {
  const { name, subject, definition, terms, toChange, drift, where } = concept;
  const id = `concept-${index + 1}`;
  const total = terms.reduce((sum, { uses }) => sum + uses, 0);
  const rows = terms.map(
    ({ text, status, uses, documents }) =>
      html`<tr>
        <th scope="row">${text}</th>
        <td class="status">${status}</td>
        <td class="bar">${shareBar(uses, total, SERIES[status])}</td>
        <td class="number">${shareText(uses, total)}</td>
        <td class="number">${grouped(uses)}</td>
        <td class="number">${grouped(documents)}</td>
      </tr> `,
  );
  const about = [
    ...(concept.with.length > 0 ? [`with ${listed(concept.with, 'or')}`] : []),
    ...(subject === undefined ? [] : [subject]),
  ];
  return html`<article class="entry" aria-labelledby="${id}">
    <header>
      <h3 id="${id}">${name}</h3>
      <p class="kind">
        ${about.length > 0 && `${about.join(', ')}; `}${toChange === 0 ? 'nothing to change' : `${counted(toChange, 'use')} to change`}
      </p>
    </header>
    ${definition !== undefined && html`<p>${definition}</p>`}
    <div class="wide">
      <table class="names decided">
        <thead>
          <tr>
            <th scope="col">Term</th>
            <th scope="col">Status</th>
            <td class="bar"></td>
            <th scope="col" class="number">Share</th>
            <th scope="col" class="number">Uses</th>
            <th scope="col" class="number">Pages</th>
          </tr>
        </thead>
        <tbody>
          ${rows}
        </tbody>
      </table>
    </div>
    ${drift === undefined ? html`<p class="drift">No page uses any of its names.</p>` : driftLine(drift, where)}
    ${toChange > 0 && stillToChange(concept)}
    ${folderTable(
      terms.map(({ text, status }) => ({ text, series: SERIES[status] })),
      where,
    )}
  </article> `;
}

function stillToChange({ terms }: ReportConcept): Markup {
  const places = terms.flatMap(({ status, text, pages }) =>
    status === 'deprecated' ? pages.map(({ path, uses }) => ({ text, path, uses })) : [],
  );
  places.sort((a, b) => b.uses - a.uses);
  const item = ({ path, text, uses }: (typeof places)[number]): Markup =>
    html`<li><span class="place">${path}</span> “${text}”, ${counted(uses, 'use')}</li> `;
  const rest = places.slice(PAGES_SHOWN);
  return html`<h4 class="drift">Still to change</h4>
    <ul class="reasons">
      ${places.slice(0, PAGES_SHOWN).map(item)}
    </ul>
    ${
      rest.length > 0 &&
      html`<details>
        <summary>${counted(rest.length, 'more place')}</summary>
        <ul class="reasons">
          ${rest.map(item)}
        </ul>
      </details>`
    }`;
}
