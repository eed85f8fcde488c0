import { format } from 'node:util';
import {
  ASYMMETRIC_MATCHERS_OBJECT,
  chai,
  JestAsymmetricMatchers,
  JestChaiExpect,
  JestExtend,
} from '@vitest/expect';
import { register, registry } from './registry.mjs';

/**
 * What the statistics tests use of `vitest`, without its workers: tests are collected once and called
 * again for each mutant. The comparisons are vitest's own.
 */
chai.use(JestExtend);
chai.use(JestChaiExpect);
chai.use(JestAsymmetricMatchers);

export const expect = Object.assign(
  (value, message) => chai.expect(value, message),
  chai.expect,
  globalThis[ASYMMETRIC_MATCHERS_OBJECT],
);

/** `$key` and `$deep.key` of a row that is an object, and printf's places for the others. */
const titleOf = (template, row, index) => {
  const first = Array.isArray(row) ? row[0] : row;
  const keyed = template.replace(/\$([\w.]+)/g, (place, path) => {
    const value = path.split('.').reduce((at, key) => at?.[key], first);
    return value === undefined ? place : String(value);
  });
  return `${format(keyed, ...(Array.isArray(row) ? row : [row]))} [${index}]`;
};

const each = (declare) => (rows) => (template, body) => {
  [...rows].forEach((row, index) => {
    declare(titleOf(template, row, index), () => body(...(Array.isArray(row) ? row : [row])));
  });
};

const declareGroup = (name, body) => {
  const { names } = registry();
  names.push(name);
  try {
    body();
  } finally {
    names.pop();
  }
};

export const test = Object.assign((name, body) => register(name, body), {
  each: each((name, body) => register(name, body)),
});
export const it = test;
export const describe = Object.assign((name, body) => declareGroup(name, body), { each: each(declareGroup) });
