/** Up to so many bytes of a text stand in the three words after its length. */
export const longestWordedText = 12;

const firstCapacity = 1024;
/** No number that is kept is as small. */
const free = -2_147_483_648;

/** A hash table from the four words of a short text to a number. */
export const makeWordTable = () => {
  let capacity = firstCapacity;
  let words = new Int32Array(4 * capacity);
  let numbers = new Int32Array(capacity).fill(free);
  let count = 0;

  /** The place of the words, or the free place where they belong. */
  const placeOf = (first: number, second: number, third: number, fourth: number): number => {
    let mixed = Math.imul(first ^ Math.imul(second, 0x9e3779b1), 0x85ebca6b);
    mixed = Math.imul(mixed ^ (mixed >>> 15) ^ Math.imul(third, 0xc2b2ae35) ^ fourth, 0x27d4eb2f);
    let place = (mixed ^ (mixed >>> 16)) & (capacity - 1);
    while (numbers[place] !== free) {
      const at = 4 * place;
      if (
        words[at] === first &&
        words[at + 1] === second &&
        words[at + 2] === third &&
        words[at + 3] === fourth
      )
        break;
      place = (place + 1) & (capacity - 1);
    }
    return place;
  };

  const grow = (): void => {
    const [oldWords, oldNumbers] = [words, numbers];
    capacity *= 2;
    words = new Int32Array(4 * capacity);
    numbers = new Int32Array(capacity).fill(free);
    oldNumbers.forEach((number, place) => {
      if (number === free) return;
      const [first = 0, second = 0, third = 0, fourth = 0] = oldWords.subarray(4 * place, 4 * place + 4);
      put(first, second, third, fourth, number);
    });
  };

  const put = (first: number, second: number, third: number, fourth: number, number: number): void => {
    const place = placeOf(first, second, third, fourth);
    words.set([first, second, third, fourth], 4 * place);
    numbers[place] = number;
  };

  return {
    /** null for words that have not been seen. */
    get: (first: number, second: number, third: number, fourth: number): number | null => {
      const number = numbers[placeOf(first, second, third, fourth)] as number;
      return number === free ? null : number;
    },
    add: (first: number, second: number, third: number, fourth: number, number: number): void => {
      put(first, second, third, fourth, number);
      count += 1;
      if (2 * count > capacity) grow();
    },
  };
};
