import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs';
import type { Response } from 'supertest';
import { STARTERS } from '../../shared/design/index.js';
import { expectProblem } from '../testing/problem-answers.js';
import { type Browser, type TestSite, testSite } from '../testing/test-site.js';

/** Points on an A5 page, 148 × 210 mm (ISO 216), and on half a US letter, 5.5 × 8.5 in. */
const A5_PT = [419.53, 595.28] as const;
const HALF_LETTER_PT = [396, 612] as const;

/** Sheets are set in half a second on an idle machine; the specs may run on a busy one. */
const PATIENCE_MS = 60_000;

describe('sheets', () => {
  let site: TestSite;
  let owner: Browser;
  let id: string;

  beforeAll(async () => {
    site = await testSite({ now: () => new Date('2026-03-01T08:00:00Z') });
    owner = await site.member('Owner');
    const document = STARTERS.find((starter) => starter.id === 'laddered')?.design;
    const kept = await owner.send('POST', '/api/designs', { document });
    id = (kept.body as { id: string }).id;
  });

  afterAll(() => site.close());

  const sheet = async (name: string, query = ''): Promise<Buffer> => {
    const answer: Response = await owner.agent
      .get(`/api/designs/${id}/${name}.pdf${query}`)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => done(null, Buffer.concat(chunks)));
      });
    expect(answer.status).toBe(200);
    expect(answer.headers['content-type']).toBe('application/pdf');
    expect(answer.headers['content-disposition']).toContain('revision-1.pdf');
    return answer.body as Buffer;
  };

  it(
    'are on the paper asked for',
    async () => {
      expect(pageSizes(await sheet('card'))[0]).toEqual([...A5_PT]);
      expect(pageSizes(await sheet('card', '?paper=half-letter'))[0]).toEqual([...HALF_LETTER_PT]);
      expect(pageSizes(await sheet('cut-sheet'))).toEqual([[...A5_PT]]);
    },
    PATIENCE_MS,
  );

  it(
    'carry their fonts with them',
    async () => {
      const pdf = (await sheet('card')).toString('latin1');
      const named = [...pdf.matchAll(/\/BaseFont \/([A-Z]{6}\+)?([\w-]+)/g)];
      expect(named.length).toBeGreaterThanOrEqual(4);
      // A subset, named by six capitals, is an embedded font.
      for (const match of named) {
        expect(match[1]).toBeDefined();
        expect(match[2]).toMatch(/^IBMPlex/);
      }
      expect((pdf.match(/\/FontFile/g) ?? []).length).toBeGreaterThanOrEqual(4);
    },
    PATIENCE_MS,
  );

  it(
    'say the sizes to reach in the reader’s units',
    async () => {
      const metric = await textOf(await sheet('card'));
      expect(metric).toContain('Draw to 42 mm wide, 14 mm thick');
      expect(metric).toContain('Revision 1, printed 1 March 2026');
      expect(await textOf(await sheet('card', '?units=inch'))).toContain('1 21/32 in');
      expect(await textOf(await sheet('cut-sheet'))).toContain('8 pieces of 1084');
    },
    PATIENCE_MS,
  );

  it('are had by nobody else', async () => {
    const other = await site.member('Other');
    expectProblem(await other.get(`/api/designs/${id}/card.pdf`), 'not-found');
    expectProblem(await site.browser().get(`/api/designs/${id}/card.pdf`), 'sign-in-required');
    expectProblem(await owner.get(`/api/designs/${id}/card.pdf?paper=wallpaper`), 'invalid-request');
  });
});

function pageSizes(pdf: Buffer): number[][] {
  return [...pdf.toString('latin1').matchAll(/\/MediaBox \[0 0 ([\d.]+) ([\d.]+)\]/g)].map((match) => [
    Math.round(Number(match[1]) * 100) / 100,
    Math.round(Number(match[2]) * 100) / 100,
  ]);
}

/** All the words of a PDF, read by another program than the one that wrote it. */
async function textOf(pdf: Buffer): Promise<string> {
  const document = await getDocument({ data: new Uint8Array(pdf), verbosity: 0 }).promise;
  const words: string[] = [];
  for (let page = 1; page <= document.numPages; page++) {
    const { items } = await (await document.getPage(page)).getTextContent();
    words.push(...items.map((item) => ('str' in item ? item.str : '')));
  }
  await document.destroy();
  return words.join(' ').replace(/\s+/g, ' ');
}
