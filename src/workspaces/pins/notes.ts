import { cardsReply, movedOnReply, restatedReply } from '../../present/compose/card.ts';
import { refusalReply } from '../../present/compose/refusal.ts';
import type { Reply } from '../../present/reply.ts';
import { isoFromDay } from '../../terms/day.ts';
import type { PinnedCard } from '../../terms/pins.ts';
import type { PriceSeries, PriceSnapshot } from '../../terms/prices.ts';
import type { Desk } from '../desk.ts';
import { changesThePast, dataChange } from '../records/dataChanges.ts';
import { putUp } from './pinning.ts';
import { terminalTeam } from './place.ts';
import type { Wall } from './ports.ts';

const mostLookedAt = 10_000;

type Note = { readonly kind: 'moved' | 'restated'; readonly words: Reply };

const noteKey = ({ team, channel, cardTs }: PinnedCard, kind: Note['kind']): string =>
  `note:${team}:${channel}:${cardTs}:${kind}`;

/** What the thread of a card has not been told yet. */
const notesFor = (
  card: PinnedCard,
  kept: readonly PriceSeries[],
  snapshot: PriceSnapshot,
): readonly Note[] => {
  const changes = kept.flatMap((series) => {
    const today = snapshot.series(series.ticker);
    return today === null ? [] : [dataChange(series, today)];
  });
  const restated = changes.filter(changesThePast).map(({ ticker }) => ticker);
  const lastDays = changes.flatMap(({ newCount, lastDay }) =>
    newCount > 0 && lastDay !== null ? [lastDay] : [],
  );
  const notes: Note[] = [];
  if (!card.toldRestated && restated.length > 0)
    notes.push({ kind: 'restated', words: restatedReply(card, restated) });
  if (!card.toldMoved && lastDays.length > 0)
    notes.push({ kind: 'moved', words: movedOnReply(card, isoFromDay(Math.max(...lastDays))) });
  return notes;
};

type Told = Pick<Desk, 'records' | 'pins' | 'permissions'>;

/** Nobody waits for it there: it is posted only where the place may still be posted to. Its owner may have left. */
const mayPost = async ({ permissions }: Told, { team, channel, person }: PinnedCard): Promise<boolean> => {
  const verdict = await permissions.placeVerdict(team, channel, person ?? '');
  return verdict.kind === 'fine' || verdict.why === 'ownerLeft';
};

const tellThread = async (
  desk: Told,
  wall: Wall,
  card: PinnedCard,
  snapshot: PriceSnapshot,
): Promise<void> => {
  const { records, pins } = desk;
  const record = await records.store.find(card.answerId);
  if (!record.ok || record.value === null) return;
  const notes = notesFor(card, record.value.answer.series, snapshot);
  if (notes.length === 0 || !(await mayPost(desk, card))) return;
  let told = card;
  for (const { kind, words } of notes) {
    const thread = card.thread ?? card.cardTs;
    const said = await wall.say(noteKey(card, kind), { ...card, thread }, words);
    if (said.kind === 'said') told = { ...told, [kind === 'moved' ? 'toldMoved' : 'toldRestated']: true };
    else
      records.tell(`A note on the pinned ${card.answerId} was not posted in ${card.channel}: ${said.kind}.`);
  }
  if (told === card) return;
  // whoever took the card off meanwhile has the last word
  const now = await pins.store.find(card, card.answerId);
  if (now.ok && now.value !== null)
    await pins.store.put({ ...now.value, toldMoved: told.toldMoved, toldRestated: told.toldRestated });
};

/** Tells the threads of pinned cards, once each, that their prices have moved on or were restated. */
export const tellOfChanges = async (desk: Told, snapshot: PriceSnapshot): Promise<void> => {
  const wall = desk.pins.wall();
  const cards = await desk.pins.store.list(['pinned', 'standing'], mostLookedAt);
  if (wall === null || !cards.ok) return;
  for (const card of cards.value)
    if (card.cardTs !== null && !(card.toldMoved && card.toldRestated))
      await tellThread(desk, wall, card, snapshot);
};

/** Puts up what was wanted when the bot ended. */
export const finishCards = async (desk: Told): Promise<void> => {
  const wall = desk.pins.wall();
  const cards = await desk.pins.store.list(['posting'], mostLookedAt);
  if (wall === null || !cards.ok) return;
  for (const card of cards.value) if (await mayPost(desk, card)) await putUp(desk.pins, wall, card);
};

/** A person took the pin off: the card gets no notes any more. */
export const takenOff = async (
  { records, pins }: Pick<Told, 'records' | 'pins'>,
  team: string,
  channel: string,
  cardTs: string,
): Promise<void> => {
  const found = await pins.store.findCard(team, channel, cardTs);
  if (!found.ok) records.tell(`A pin was taken off and not noted: ${found.problem.message}`);
  else if (found.value !== null) await pins.store.put({ ...found.value, state: 'removed' });
};

/** The cards at the terminal: where nothing can be pinned to a channel, the list is the wall. */
export const cardsAtTerminal = async ({ pins }: Pick<Desk, 'pins'>): Promise<Reply> => {
  const cards = await pins.store.list(['pinned'], mostLookedAt);
  if (!cards.ok) return refusalReply(cards.problem);
  return cardsReply(cards.value.filter(({ team }) => team === terminalTeam).reverse());
};
