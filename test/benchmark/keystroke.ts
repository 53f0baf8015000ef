// Keystroke to hints through the server: a page of 5,000 words, 1,000 decided terms, each key answered by diagnostics.
import type { Diagnostic } from 'vscode-languageserver-protocol';
import { TestClient, eventually, temporaryFolder } from '../support/languageServer.js';
import { documentsOf } from './documents.js';
import { ms, quantile } from './measure.js';
import type { Row } from './measure.js';

const WORDS = 5_000;
const TERMS = 1_000;

/**
 * Types a deprecated term again and again at places all over the page; each keystroke changes the findings, so that each is
 * answered, and the time until the answer is taken. The reference is the same exchange on a page of one line.
 */
export async function measureKeystrokes(keys: number): Promise<Row> {
  const { sources } = documentsOf('knative');
  const pool = sources.map(({ text }) => text).join('\n\n');
  const words = [...new Set(pool.match(/\b[a-z]{5,12}\b/g) ?? [])].sort();
  const step = Math.max(1, Math.floor(words.length / TERMS / 2));
  const terms = Array.from(
    { length: TERMS },
    (_, at) => `${words[(at * step * 2) % words.length]!} ${words[(at * step * 2 + step) % words.length]!}`,
  );
  const termbase = `evenword: 1\nconcepts:\n${[...new Set(terms)].map((term, at) => `  - preferred: concept ${at}\n    deprecated: ["${term}"]\n`).join('')}`;
  const page = pool.split(/\s+/).length < WORDS ? pool : firstWords(pool, WORDS);
  const folder = await temporaryFolder({ 'termbase.yaml': termbase, 'page.md': page, 'line.md': 'One line.\n' });
  const client = await TestClient.start([folder.path]);
  try {
    await eventually('the survey', () => client.states.some(({ state }) => state === 'ready'));
    const small = await typeInto(client, folder.uri('line.md'), 'One line.\n', terms[0]!, keys);
    const large = await typeInto(client, folder.uri('page.md'), page, terms[0]!, keys);
    const [p50, p95, p99] = [0.5, 0.95, 0.99].map((q) => quantile(large, q)) as [number, number, number];
    return {
      goal: `Keystroke to hints, ${WORDS.toLocaleString('en')} words, ${TERMS.toLocaleString('en')} terms (p50, p95, p99)`,
      ours: `${ms(p50)}, ${ms(p95)}, ${ms(p99)}`,
      reference: `on one line ${ms(quantile(small, 0.5))}, ${ms(quantile(small, 0.95))}, ${ms(quantile(small, 0.99))}`,
      figure: `${(p50 / quantile(small, 0.5)).toFixed(1)} ×`,
      target: '≤ 2, 10, 16 ms',
      reached: p50 <= 2 && p95 <= 10 && p99 <= 16,
    };
  } finally {
    await client.end();
    await folder.dispose();
  }
}

async function typeInto(client: TestClient, uri: string, text: string, term: string, keys: number): Promise<number[]> {
  await client.open(uri, text);
  const lines = text.split('\n');
  const ends = lines.map((line, at) => ({ line: at, text: line })).filter((each) => /^[A-Z].*[a-z]\.$/.test(each.text));
  const times: number[] = [];
  const typed = term.slice(0, -1);
  const last = term.slice(-1);
  for (let key = 0; key < keys; key++) {
    const { line, text: before } = ends[(key * 7) % ends.length]!;
    const at = { line, character: before.length };
    await client.change(uri, ` ${typed}`, { start: at, end: at });
    const caret = { line, character: before.length + 1 + typed.length };
    // Typing the term's last letter makes the finding; taking it out again ends it.
    times.push(await answered(client, uri, () => client.change(uri, last, { start: caret, end: caret })));
    const after = { line, character: caret.character + 1 };
    times.push(await answered(client, uri, () => client.change(uri, '', { start: at, end: after })));
  }
  // The first keys find the code cold.
  return times.slice(Math.min(40, times.length >> 2));
}

async function answered(client: TestClient, uri: string, send: () => Promise<void>): Promise<number> {
  const before = client.published.length;
  const start = performance.now();
  const answer = new Promise<void>((resolve) => {
    const listening = client.connection.onNotification(
      'textDocument/publishDiagnostics',
      (params: { uri: string; diagnostics: Diagnostic[] }) => {
        client.published.push(params);
        if (params.uri === uri && client.published.length > before) {
          listening.dispose();
          resolve();
        }
      },
    );
  });
  await send();
  await answer;
  return performance.now() - start;
}

function firstWords(text: string, count: number): string {
  let at = 0;
  for (let words = 0; words < count && at < text.length; at++)
    if (/\s/.test(text[at]!) && /\S/.test(text[at - 1] ?? ' ')) words++;
  return text.slice(0, at);
}
