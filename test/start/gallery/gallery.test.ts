import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { galleryPage } from '../../../src/start/gallery/page.ts';
import { galleryQuestions } from '../../../src/start/gallery/questions.ts';
import { screenOf } from '../../../src/start/gallery/screen.ts';
import { writeGallery } from '../../../src/start/gallery/writeGallery.ts';
import { drawInline } from '../../../src/start/pictures/draw.ts';
import { createConverse } from '../../../src/workspaces/converse.ts';
import { demoDesk } from '../../e2e/demoDesk.ts';

const folder = mkdtempSync(join(tmpdir(), 'leadsman-gallery-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

test('one question is written with its picture and a page that shows it', async () => {
  const converse = createConverse({ ...(await demoDesk(false)), drawing: drawInline() });
  const page = await writeGallery(folder, converse, ['interval KELP 60d as picture']);
  const [picture, ...others] = readdirSync(folder).filter((name) => name.endsWith('.png'));
  expect(others).toEqual([]);
  expect(picture).toMatch(/^01-interval-KELP-R-\w+\.png$/);
  const html = readFileSync(page, 'utf8');
  expect(html).toContain(`src="${picture}"`);
  expect(html).toContain('alt="Interval ladder.');
  expect(html).toContain('<th class="left">% a day (a year)</th>');
});

test('every picture that answers and the feed have is in the gallery', () => {
  const verbs = [
    'interval',
    'vol',
    'ratio',
    'claim',
    'need',
    'compare',
    'tail',
    'beyond',
    'shape',
    'backtest',
    'feed',
  ];
  for (const verb of verbs)
    expect(galleryQuestions.some((each) => each.includes(verb) && each.endsWith('as picture'))).toBe(true);
});

test('what people write stays text on the page', () => {
  const message = { text: 'x', blocks: [] };
  const html = galleryPage([{ question: '<b>&', replies: [{ text: '<i>', message, pictures: [] }] }]);
  expect(html).toContain('<h2>&lt;b&gt;&amp;</h2>');
  expect(html).not.toContain('<i>');
});

test('without a browser a screen is left out, and that is said', async () => {
  const nowhere = join(folder, 'no-browser');
  const said = await screenOf(join(folder, 'no-page.html'), join(folder, 'screen.png'), nowhere);
  expect(said).toBe(`No screen was taken: there is no browser at ${nowhere}.`);
});
