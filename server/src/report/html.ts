// report.html: one self-contained page, without scripts and without anything from elsewhere.
import { conceptsPart, otherParts } from './htmlConcepts.js';
import { questionsPart } from './htmlQuestions.js';
import { html, Markup } from './markup.js';
import type { Figure, ReportData } from './reportData.js';
import { STYLE } from './style.js';
import { grouped } from './words.js';

/** Writes the report as an HTML document. */
export function toHtml(data: ReportData): string {
  const { folder, generatedAt, state } = data;
  return html`<!DOCTYPE html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="color-scheme" content="light dark" />
        <meta name="generator" content="Evenword" />
        <title>Terminology report: ${folder}</title>
        <style>
          ${new Markup(STYLE)}
        </style>
      </head>
      <body>
        <a class="skip" href="#main">Skip to the open questions</a>
        <div class="sheet">
          <header>
            <div class="masthead">
              <h1>Terminology report: ${folder}</h1>
              ${generatedAt !== undefined && html`<p class="faint">${generatedAt}</p>`}
            </div>
            <p class="state">${state}</p>
            <dl class="figures">${data.figures.map(figure)}</dl>
            ${contents(data)}
          </header>
          <main id="main">${questionsPart(data.questions)}${conceptsPart(data)}${otherParts(data)}${reading}</main>
          <footer><p>Made by Evenword on the machine that holds the documents; nothing was sent anywhere.</p></footer>
        </div>
      </body>
    </html> `.html;
}

function figure({ label, text, note }: Figure): Markup {
  return html`<div>
    <dt>${label}</dt>
    <dd class="value">${text}</dd>
    <dd class="note">${note}</dd>
  </div> `;
}

function contents({ questions, concepts, apart, later, otherTermbases }: ReportData): Markup {
  const entry = (id: string, title: string, count?: number): Markup =>
    html`<li>
      <a href="#${id}">${title}</a>${count !== undefined && html` <span class="faint">${grouped(count)}</span>`}
    </li> `;
  return html`<nav class="contents" aria-label="Contents">
    <ul>
      ${entry('questions', 'Open questions', questions.length)}${entry('concepts', 'Decided concepts', concepts.length)}${
        apart.length > 0 && entry('apart', 'Kept apart', apart.length)
      }${later.length > 0 && entry('later', 'Put off', later.length)}${
        otherTermbases.length > 0 && entry('others', 'Folders with decisions of their own', otherTermbases.length)
      }${entry('reading', 'How to read the figures')}
    </ul>
  </nav>`;
}

const reading = html`<section class="part" aria-labelledby="reading">
  <h2 id="reading">How to read the figures</h2>
  <dl class="terms">
    <dt>Uses</dt>
    <dd>
      Counted in running text, in every inflected form. Code, quotations and passages that are repeated word for word
      are left out. A check of the pages names fewer places, since it is silent where it is not sure.
    </dd>
    <dt>Names in effect</dt>
    <dd>
      How mixed a concept’s naming is: 1.0 where one name is used alone, 2.0 where two are used half and half, less
      where one of them is rare. It is 2<sup>H</sup>, with H the entropy of the names’ uses in bits (C. E. Shannon,
      1948). The figure at the top is the mean over all concepts, decided and asked, each weighing as much as it is
      used.
    </dd>
    <dt>Where the mix is</dt>
    <dd>
      The mutual information of name and folder, and of name and page, as a share of that entropy (T. M. Cover and J. A.
      Thomas, <cite>Elements of Information Theory</cite>, chapter 2), less what chance alone would give (G. A. Miller,
      1955). It is said where there are uses enough to say it. Folders are counted with names inside longer names left
      out.
    </dd>
    <dt>Sure</dt>
    <dd>
      How strong the evidence is that the names stand for one thing. A question is a question: it may be two things, and
      then the answer keeps them apart.
    </dd>
  </dl>
</section> `;
