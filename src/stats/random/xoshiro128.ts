import type { Random, RandomStreams } from '../../terms/random.ts';

/** The generator xoshiro128++: period 2^128 − 1, 32 bits a draw. State words are kept as signed 32-bit integers. */
class Xoshiro128PlusPlus implements Random {
  private word0: number;
  private word1: number;
  private word2: number;
  private word3: number;

  constructor(word0: number, word1: number, word2: number, word3: number) {
    this.word0 = word0 | 0;
    this.word1 = word1 | 0;
    this.word2 = word2 | 0;
    this.word3 = word3 | 0;
  }

  nextUint32(): number {
    const word0 = this.word0;
    const word1 = this.word1;
    const word2 = this.word2 ^ word0;
    const word3 = this.word3 ^ word1;
    const sum = (word0 + this.word3) | 0;
    const drawn = (((sum << 7) | (sum >>> 25)) + word0) >>> 0;
    this.word0 = word0 ^ word3;
    this.word1 = word1 ^ word2;
    this.word2 = word2 ^ (word1 << 9);
    this.word3 = (word3 << 11) | (word3 >>> 21);
    return drawn;
  }
}

/**
 * A generator that starts from a given state of four 32-bit words.
 *
 * Domain: not all words zero, for that state never changes; it throws.
 * Source: Blackman & Vigna 2021, ACM Transactions on Mathematical Software 47 (4), article 36.
 * Example: `xoshiro128PlusPlus(1, 2, 3, 4).nextUint32()` is 641.
 */
export const xoshiro128PlusPlus = (word0: number, word1: number, word2: number, word3: number): Random => {
  if ((word0 | word1 | word2 | word3) === 0) {
    throw new RangeError('xoshiro128PlusPlus: the state must not be all zero');
  }
  return new Xoshiro128PlusPlus(word0, word1, word2, word3);
};

/** Every bit of the input moves every bit of the output; one to one. The finaliser of MurmurHash3 (Appleby 2011). */
const mixBits = (word: number): number => {
  let mixed = word;
  mixed = Math.imul(mixed ^ (mixed >>> 16), 0x85ebca6b);
  mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
  return mixed ^ (mixed >>> 16);
};

/** The fraction of the golden ratio in 32 bits, odd: multiples of it spread over the whole range. */
const goldenWord = 0x9e3779b9;

const wordsOfSeed = (seed: Uint8Array): Int32Array => {
  const words = new Int32Array(8);
  for (let index = 0; index < 32; index += 1) {
    const place = index >> 2;
    words[place] = ((words[place] as number) << 8) | (seed[index] as number);
  }
  return words;
};

/**
 * One stream of random numbers per replicate number, all from one seed.
 *
 * Convention: the seed is read as eight words, first byte highest. Word k of a stream's state is made of the replicate
 * number's two halves, mixed one after the other with seed words k and k + 4. For a fixed upper half the first word is a
 * one-to-one function of the lower half, so two replicates below 2^32 never share a state.
 * Domain: 32 bytes (a SHA-256 digest, say); whole replicate numbers from 0 to 2^53 − 1. Anything else throws.
 * Edges: the all-zero state, which the generator cannot leave, is replaced by a fixed other one.
 * Source: xoshiro128++ of Blackman & Vigna 2021; mixing by the finaliser of MurmurHash3 (Appleby 2011).
 * Example: `createStreams(seed).stream(7)` gives the same numbers however often and wherever it is asked for.
 */
export const createStreams = (seed: Uint8Array): RandomStreams => {
  if (seed.length !== 32) throw new RangeError(`createStreams: ${seed.length} bytes of seed, 32 are needed`);
  const words = wordsOfSeed(seed);
  const stateWord = (place: number, lower: number, upper: number): number => {
    const first = mixBits(lower + (words[place] as number) + Math.imul(place + 1, goldenWord));
    return mixBits(mixBits(first + upper) ^ (words[place + 4] as number));
  };
  const stream = (replicate: number): Random => {
    if (!Number.isSafeInteger(replicate) || replicate < 0) {
      throw new RangeError(`createStreams: replicate number ${replicate} is not a whole number from 0`);
    }
    const lower = replicate | 0;
    const upper = Math.floor(replicate / 2 ** 32);
    const word0 = stateWord(0, lower, upper);
    const word1 = stateWord(1, lower, upper);
    const word2 = stateWord(2, lower, upper);
    const word3 = stateWord(3, lower, upper);
    const allZero = (word0 | word1 | word2 | word3) === 0;
    return new Xoshiro128PlusPlus(allZero ? goldenWord : word0, word1, word2, word3);
  };
  return { stream };
};
