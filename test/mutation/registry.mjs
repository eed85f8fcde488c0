/**
 * The tests of one environment, in the order they were declared. It lives on `globalThis` because the
 * stand-in for `vitest` is evaluated anew with every environment, and the runner outside reads it.
 */
const place = Symbol.for('leadsman.mutation.tests');

export const startRegistry = () => {
  globalThis[place] = { file: '', names: [], tests: new Map() };
};

export const registry = () => globalThis[place];

/** Ids are unique: two tests of one file with the same name are told apart by their order. */
export const register = (name, body) => {
  const { file, names, tests } = registry();
  const plain = `${file}#${[...names, name].join(' ')}`;
  let id = plain;
  for (let copy = 2; tests.has(id); copy += 1) id = `${plain} (${copy})`;
  tests.set(id, { id, name: [...names, name].join(' '), file, body });
};
