import { expect, test } from 'vitest';
import { limitFaults } from '../../src/present/limits/limitFaults.ts';
import { pictureMessage } from '../../src/present/pictureMessage.ts';

const picture = { title: 'KELP’s tail', altText: 'Losses of <KELP> & others, see http://example.org @here.' };

test('a picture is shown by its file, described for screen readers, and its text is no markup', () => {
  const { text, blocks } = pictureMessage(picture, 'F1');
  expect(blocks).toEqual([
    {
      type: 'image',
      slack_file: { id: 'F1' },
      alt_text: picture.altText,
      title: { type: 'plain_text', text: 'KELP’s tail', emoji: false },
    },
  ]);
  expect(text).toContain('&lt;KELP&gt; &amp; others');
  expect(text).not.toMatch(/:\/\/|@here/);
});

test('however long the words are, the platform takes them', () => {
  const long = { title: 'tail '.repeat(900), altText: '<loss> '.repeat(3_000) };
  const message = pictureMessage(long, 'F1');
  expect(limitFaults(message)).toEqual([]);
  // limits.json, image: altText 2,000 and title 2,000 characters at most
  expect(message.blocks[0]?.alt_text.length).toBeLessThanOrEqual(2_000);
  expect(message.blocks[0]?.title.text.length).toBeLessThanOrEqual(2_000);
});
