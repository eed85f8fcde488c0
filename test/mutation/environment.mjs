import { fileURLToPath } from 'node:url';
import { createServer, createServerModuleRunner } from 'vite';
import { registry, startRegistry } from './registry.mjs';

/**
 * The header of a mutated file counts which places are passed, and asks for the active mutant through functions
 * that replace themselves. Judging needs no counts, and functions that stay can be inlined.
 */
const withoutCounting = (text) =>
  text
    .replace('function stryCov_9fa48() {', 'function stryCov_9fa48() { return;')
    .replace('stryCov_9fa48 = cover;', '')
    .replace(
      'function stryMutAct_9fa48(id) {',
      `function stryMutAct_9fa48(id) {
         const stryker = globalThis.__stryker__;
         if (stryker.activeMutant !== id) return false;
         if (++stryker.hitCount > stryker.hitLimit) throw new Error('the mutant was passed too often');
         return true;`,
    )
    .replace('stryMutAct_9fa48 = isActive;', '');

/** Counting by number into an array, in place of the header's counting by name into one object per test. */
const countingFast = (text) =>
  text
    .replace(
      'function stryCov_9fa48() {',
      `function stryCov_9fa48() {
         const { counts } = globalThis.__stryker__;
         for (let place = 0; place < arguments.length; place += 1) counts[arguments[place]] += 1;
         return;`,
    )
    .replace('stryCov_9fa48 = cover;', '')
    .replace(/stryCov_9fa48\(("[^)]*)\)/g, (call) => call.replaceAll('"', ''));

/**
 * The tests and the sources of the working directory, loaded into this process. `load` evaluates every module anew,
 * `originals` in place of the mutated files but for the one named; without a name all are mutated and count.
 */
export const openEnvironment = async (testFiles) => {
  const root = process.cwd();
  let originals = {};
  let mutated = null;
  const chooseText = {
    name: 'one-mutated-file',
    enforce: 'pre',
    transform: (text, id) => {
      const original = originals[id];
      if (original === undefined) return null;
      if (mutated === null) return countingFast(text);
      return id === mutated ? withoutCounting(text) : original;
    },
  };
  const server = await createServer({
    configFile: false,
    root,
    logLevel: 'error',
    appType: 'custom',
    plugins: [chooseText],
    server: { middlewareMode: true, hmr: false, ws: false, watch: null },
    optimizeDeps: { noDiscovery: true },
    resolve: { alias: { vitest: fileURLToPath(new URL('testApi.mjs', import.meta.url)) } },
  });
  const { moduleGraph } = server.environments.ssr;
  const modules = createServerModuleRunner(server.environments.ssr, {
    hmr: false,
    sourcemapInterceptor: false,
  });
  const forget = (id) => {
    const known = moduleGraph.getModuleById(id);
    if (known !== undefined) moduleGraph.invalidateModule(known);
  };
  return {
    load: async () => {
      modules.clearCache();
      startRegistry();
      for (const file of testFiles) {
        registry().file = file;
        await modules.import(`${root}/${file}`);
      }
      return registry().tests;
    },
    /** What the next `load` takes; `file` is the one that stays mutated, '' for none, null for all. */
    mutateOnly: (file, originalTexts) => {
      const isOne = mutated !== null && file !== null;
      for (const id of isOne ? [mutated, file] : Object.keys(originalTexts)) forget(id);
      originals = originalTexts;
      mutated = file;
    },
    close: async () => {
      await modules.close();
      await server.close();
    },
  };
};
