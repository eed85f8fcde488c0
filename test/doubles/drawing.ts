import { pictureOf } from '../../src/answers/pictures/pictureOf.ts';
import { sheetOf } from '../../src/present/picture/sheetOf.ts';
import { succeed } from '../../src/terms/result.ts';
import type { Drawing } from '../../src/workspaces/pictures.ts';

/** The eight bytes that every PNG begins with. */
export const emptyPng = new Uint8Array([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);

/** Lays every picture out and says what it shows, but draws nothing. */
export const layingOut: Drawing = {
  draw: async (job, answers) => {
    const data = pictureOf(job, answers);
    return data.ok ? layingOut.drawData(data.value) : data;
  },
  drawData: async (data) => {
    const { altText, title, fileName } = sheetOf(data);
    return succeed({ png: emptyPng, altText, title, fileName });
  },
};
