import { spawnSync } from 'node:child_process';
import { parts } from './parts.mjs';
import { summaryOf } from './summary.mjs';

/**
 * `npm run mutate`: every part in turn, then the table of all. `npm run mutate -- mean claims`: those parts.
 * Anything that begins with an option goes to the mutation tool as it stands.
 */
const asked = process.argv.slice(2);

const mutate = (options, name) =>
  spawnSync('npx', ['stryker', 'run', '.stryker.config.mjs', ...options], {
    stdio: 'inherit',
    env: { ...process.env, MUTATION_PART: name ?? '' },
  });

if (asked[0]?.startsWith('-')) {
  process.exit(mutate(asked).status ?? 1);
}
const chosen = asked.length === 0 ? parts : parts.filter(({ name }) => asked.includes(name));
const failed = chosen.filter(({ name }) => mutate([], name).status !== 0);
console.log(summaryOf(chosen.map(({ name }) => name)));
for (const { name } of failed) console.error(`The part ${name} could not be mutated.`);
process.exit(failed.length === 0 ? 0 : 1);
