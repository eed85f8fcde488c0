import { pictureOf } from '../../answers/pictures/pictureOf.ts';
import { sheetOf } from '../../present/picture/sheetOf.ts';
import { toSvg } from '../../present/picture/toSvg.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Picture } from '../../workspaces/pictures.ts';
import type { PictureOrder } from './order.ts';
import { toPng } from './png.ts';

/** The task of the thread that draws. The libraries for drawing are slow to load; only this file loads them. */
export default async (order: PictureOrder): Promise<Result<Picture>> => {
  const data = order.kind === 'data' ? succeed(order.data) : pictureOf(order.job, order.answers);
  if (!data.ok) return data;
  const sheet = sheetOf(data.value);
  const { altText, title, fileName } = sheet;
  return succeed({ png: toPng(await toSvg(sheet)), altText, title, fileName });
};
