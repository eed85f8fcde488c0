import { fileURLToPath } from 'node:url';
import { createServer, createServerModuleRunner } from 'vite';
import { registry, startRegistry } from './registry.mjs';

/** Asking for the active mutant by a function that stays, so that it can be inlined; the header's replaces itself. */
const withQuickSwitches = (text) =>
  text
    .replace(
      'function stryMutAct_9fa48(id) {',
      `function stryMutAct_9fa48(id) {
         const stryker = globalThis.__stryker__;
         if (stryker.activeMutant !== id) return false;
         if (++stryker.hitCount > stryker.hitLimit) throw new Error('the mutant was passed too often');
         return true;`,
    )
    .replace('stryMutAct_9fa48 = isActive;', '');

const countingCall = /stryCov_9fa48\(((?:"\d+"(?:, )?)+)\)/g;

/** For judging, which needs no counts. */
const withoutCounting = (text) => withQuickSwitches(text).replace(countingCall, '0');

/** Counting in place, by number into an array; the header counts by name into one object per test. */
const countingInPlace = (text) =>
  `const stryCount = globalThis.__stryker__.counts; ${withQuickSwitches(text).replace(
    countingCall,
    (_, mutants) => `(${mutants.replace(/"(\d+)"/g, 'stryCount[$1]++')})`,
  )}`;

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
      if (mutated === null) return countingInPlace(text);
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
