import type { BlockMessage } from '../../present/blocks.ts';

/** One question with everything that is said to it. */
export type Exhibit = {
  readonly question: string;
  readonly replies: readonly {
    readonly text: string;
    readonly message: BlockMessage;
    readonly pictures: readonly { readonly file: string; readonly altText: string }[];
  }[];
};

const escaped = (text: string): string =>
  text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;').replace(/"/g, '&quot;');

type Shown = BlockMessage['blocks'][number];

const blockHtml = (block: Shown): string => {
  switch (block.type) {
    case 'section':
      return `<p>${escaped(block.text.text)}</p>`;
    case 'context':
      return block.elements.map(({ text }) => `<p class="quiet">${escaped(text)}</p>`).join('');
    case 'table': {
      const cells = (row: (typeof block.rows)[number], tag: string): string =>
        row
          .map(
            ({ text }, column) =>
              `<${tag} class="${block.column_settings[column]?.align ?? 'left'}">${escaped(text)}</${tag}>`,
          )
          .join('');
      return `<table>${block.rows.map((row, place) => `<tr>${cells(row, place === 0 ? 'th' : 'td')}</tr>`).join('')}</table>`;
    }
    case 'actions':
      return `<p>${block.elements.map(({ text }) => `<span class="button">${escaped(text.text)}</span>`).join(' ')}</p>`;
  }
};

const pictureHtml = ({ file, altText }: Exhibit['replies'][number]['pictures'][number]): string =>
  `<img class="wide" src="${escaped(file)}" alt="${escaped(altText)}"><img class="narrow" src="${escaped(file)}" alt="">` +
  `<p class="quiet">${escaped(altText)}</p>`;

const messageHtml = ({ message, pictures }: Exhibit['replies'][number]): string =>
  message.blocks.map(blockHtml).join('') + pictures.map(pictureHtml).join('');

/** The same message on a light and on a dark page, then its text as notifications and the terminal have it. */
const replyHtml = (reply: Exhibit['replies'][number]): string =>
  ['light', 'dark'].map((ground) => `<div class="message ${ground}">${messageHtml(reply)}</div>`).join('') +
  `<details><summary>Text of notifications and screen readers</summary><pre>${escaped(reply.message.text)}</pre></details>` +
  `<details><summary>Terminal</summary><pre>${escaped(reply.text)}</pre></details>`;

const exhibitHtml = ({ question, replies }: Exhibit, place: number): string =>
  `<section id="q${place}"><h2>${escaped(question)}</h2>${replies.map(replyHtml).join('')}</section>`;

const style = `
body { font: 15px/1.45 sans-serif; margin: 24px; color: #1a1a1a; }
h2 { font: 16px monospace; border-top: 1px solid #bbb; padding-top: 16px; }
.message { display: inline-block; vertical-align: top; width: 540px; box-sizing: content-box; padding: 12px 16px; margin: 4px; border-radius: 6px; border: 1px solid #ccc; }
.dark { background: #1b1d21; color: #e3e3e3; }
.quiet { font-size: 12px; opacity: .8; }
table { border-collapse: collapse; font-size: 13px; } th, td { border: 1px solid #999; padding: 3px 8px; } .right { text-align: right; }
.button { border: 1px solid #999; border-radius: 4px; padding: 2px 10px; font-size: 13px; }
img.wide { width: 480px; display: block; } img.narrow { width: 360px; display: block; margin-top: 8px; }
pre { white-space: pre-wrap; font-size: 12px; background: #f4f4f4; padding: 8px; }
`;

/** A page of our own that shows everything there is to be looked at. */
export const galleryPage = (exhibits: readonly Exhibit[]): string =>
  `<!doctype html><html lang="en"><meta charset="utf-8"><title>Replies and pictures</title><style>${style}</style>` +
  `<h1>Replies and pictures</h1><ol>${exhibits.map(({ question }, place) => `<li><a href="#q${place}">${escaped(question)}</a></li>`).join('')}</ol>` +
  `${exhibits.map(exhibitHtml).join('\n')}</html>\n`;
