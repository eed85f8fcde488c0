/**
 * The smallest whole count from 2 on that is enough, given that every larger count then is too. Gallops from a guess, so a
 * good guess costs a handful of looks.
 */
export const smallestCount = (isEnough: (count: number) => boolean, guess: number): number => {
  let enough = Math.max(2, Math.ceil(guess));
  let step = 1;
  while (!isEnough(enough)) {
    enough += step;
    step *= 2;
  }
  let short = enough - 1;
  for (step = 1; short >= 2 && isEnough(short); step *= 2) {
    enough = short;
    short -= step;
  }
  short = Math.max(1, short);
  while (enough - short > 1) {
    const middle = Math.floor((enough + short) / 2);
    if (isEnough(middle)) enough = middle;
    else short = middle;
  }
  return enough;
};

/**
 * Above a million returns the t distribution is the normal one but for a shift of about z²/2 returns; what the shift leaves
 * is of the order of one divided by the count: the formula then stands for the search.
 */
export const mostSearched = 1e6;
