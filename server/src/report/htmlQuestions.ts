// Open questions in the report's HTML: all at a glance, then each with its names, reasons and sentences side by side.
import { driftLine, folderTable, shareBar, sharesBar, shareText } from './htmlNames.js';
import { html } from './markup.js';
import type { Markup } from './markup.js';
import type { ReportExample, ReportQuestion } from './reportData.js';
import { counted, grouped, KIND_NAMES, percent, titleOf } from './words.js';

/** The part on open questions. */
export function questionsPart(questions: readonly ReportQuestion[]): Markup {
  const body =
    questions.length === 0
      ? html`<p>No question is open.</p>`
      : html`<p>
            Each may be one thing under several names. They stand in the order of what an answer settles, weighed by how
            sure the evidence is. Only answers become rules.
          </p>
          ${glance(questions)} ${questions.map(questionEntry)}`;
  return html`<section class="part" aria-labelledby="questions">
    <h2 id="questions">Open questions</h2>
    ${body}
  </section> `;
}

function glance(questions: readonly ReportQuestion[]): Markup {
  const rows = questions.map(
    (question, index) =>
      html`<tr>
        <td class="number">${index + 1}</td>
        <th scope="row"><a href="#question-${index + 1}">${namesOf(question)}</a></th>
        <td class="bar">${sharesBar(question.terms.map(({ uses }, series) => ({ uses, series })))}</td>
        <td class="number extra">${question.terms.map(({ uses }) => grouped(uses)).join(' / ')}</td>
        <td class="number">${grouped(question.settles)}</td>
        <td class="number">${question.drift?.names.toFixed(1) ?? '–'}</td>
      </tr> `,
  );
  return html`<div class="wide">
    <table class="glance">
      <caption>
        All at a glance. “Settles” counts the uses outside the leading name.
      </caption>
      <thead>
        <tr>
          <th scope="col" class="number">No.</th>
          <th scope="col">Names</th>
          <td class="bar"></td>
          <th scope="col" class="number extra">Uses</th>
          <th scope="col" class="number">Settles</th>
          <th scope="col" class="number">Names in effect</th>
        </tr>
      </thead>
      <tbody>
        ${rows}
      </tbody>
    </table>
  </div>`;
}

function questionEntry(question: ReportQuestion, index: number): Markup {
  const { kind, confidence, terms, reasons, examples, drift, where, language, settles } = question;
  const id = `question-${index + 1}`;
  const total = terms.reduce((sum, { uses }) => sum + uses, 0);
  const rows = terms.map(
    ({ text, uses, documents }, series) =>
      html`<tr>
        <th scope="row">${text}</th>
        <td class="bar">${shareBar(uses, total, series)}</td>
        <td class="number">${shareText(uses, total)}</td>
        <td class="number">${grouped(uses)}</td>
        <td class="number">${grouped(documents)}</td>
      </tr> `,
  );
  return html`<article class="entry" aria-labelledby="${id}">
    <header>
      <h3 id="${id}"><span class="count">${index + 1}</span>${titleOf(question)}</h3>
      <p class="kind">${KIND_NAMES[kind]}, ${percent(confidence)} sure; settles ${counted(settles, 'use')}</p>
    </header>
    <table class="names">
      <thead>
        <tr>
          <th scope="col">Name</th>
          <td></td>
          <th scope="col" class="number">Share</th>
          <th scope="col" class="number">Uses</th>
          <th scope="col" class="number">Pages</th>
        </tr>
      </thead>
      <tbody>
        ${rows}
      </tbody>
    </table>
    ${driftLine(drift, where)}
    ${
      reasons.length > 0 &&
      html`<ul class="reasons">
        ${reasons.map(({ text }) => html`<li>${sentence(text)}</li>`)}
      </ul>`
    }
    ${
      examples.length > 0 &&
      html`<div
        class="evidence"
        ${language !== undefined && language !== 'und' && language !== 'en' && html` lang="${language}"`}
      >
        ${terms.map(({ text }, series) => evidence(text, series, examples))}
      </div>`
    }
    ${folderTable(
      terms.map(({ text }, series) => ({ text, series })),
      where,
    )}
  </article> `;
}

function evidence(term: string, series: number, examples: readonly ReportExample[]): Markup | false {
  const own = examples.filter((example) => example.term === term);
  return (
    own.length > 0 &&
    html`<div class="s${Math.min(series, 3)}">
      <h4>${term}</h4>
      <ul>
        ${own.map(
          ({ path, line, text, highlight: { start, end } }) =>
            html`<li>
              <p>${text.slice(0, start)}<mark>${text.slice(start, end)}</mark>${text.slice(end)}</p>
              <span class="place">${path}, line ${line}</span>
            </li> `,
        )}
      </ul>
    </div>`
  );
}

/** A reason is a fragment; as an item of a list it begins with a capital unless it begins with a quoted name. */
function sentence(text: string): string {
  return text.slice(0, 1).toUpperCase() + text.slice(1);
}

/** The names of a question in a word or two; for verbs with the object that makes them one operation. */
function namesOf({ terms, objects }: ReportQuestion): string {
  const names = terms.map(({ text }) => text).join(' / ');
  return objects === undefined ? names : `${names} (${objects[0]!}${objects.length > 1 ? ' …' : ''})`;
}
