import type {
  LastAnswered,
  RecordExamination,
  RecordedAnswer,
  RecordedAsking,
  RecordFilter,
  RecordLine,
  ThreadPlace,
  Versions,
} from '../../terms/records.ts';
import type { Result } from '../../terms/result.ts';
import type { PinStore } from '../pins/ports.ts';

/** An answer on record with every time that it was given, the first first. */
export type OnRecord = { readonly answer: RecordedAnswer; readonly askings: readonly RecordedAsking[] };

/** What a conversation needs of the store. Whatever goes wrong there comes back as a problem. */
export type RecordStore = {
  /** The content that is on record under an id; null where the id is free. */
  readonly contentOf: (id: string) => Promise<Result<string | null>>;
  readonly keep: (answer: RecordedAnswer, asking: RecordedAsking) => Promise<Result<null>>;
  readonly find: (id: string) => Promise<Result<OnRecord | null>>;
  /** The newest askings first, at most so many. */
  readonly list: (filter: RecordFilter, most: number) => Promise<Result<readonly RecordLine[]>>;
  readonly verify: () => Promise<Result<RecordExamination>>;
  readonly pins: PinStore;
  readonly conversations: {
    /** What was answered in a thread, the newest first, at most so many. */
    readonly lastIn: (thread: ThreadPlace, most: number) => Promise<Result<readonly LastAnswered[]>>;
    /** What a person of a team asked, the newest first, at most so many. */
    readonly askedBy: (
      team: string | null,
      person: string,
      most: number,
    ) => Promise<Result<readonly RecordLine[]>>;
  };
};

/** The records of a desk: where they are, whether answers are put there, and by whom. */
export type DeskRecords = {
  readonly store: RecordStore;
  /** False where records are only read. */
  readonly keeps: boolean;
  readonly versions: Versions;
  /** Tells the operator what people need not know in full. */
  readonly tell: (message: string) => void;
};
