import { fileURLToPath } from 'node:url';
import { createServer, createServerModuleRunner } from 'vite';
import { registry, startRegistry } from './registry.mjs';

/**
 * The tests and the mutated sources of the working directory, loaded into this process. `load` evaluates
 * every module anew; their transformed text is kept.
 */
export const openEnvironment = async (testFiles) => {
  const root = process.cwd();
  const server = await createServer({
    configFile: false,
    root,
    logLevel: 'error',
    appType: 'custom',
    server: { middlewareMode: true, hmr: false, ws: false, watch: null },
    optimizeDeps: { noDiscovery: true },
    resolve: { alias: { vitest: fileURLToPath(new URL('testApi.mjs', import.meta.url)) } },
  });
  const modules = createServerModuleRunner(server.environments.ssr, {
    hmr: false,
    sourcemapInterceptor: false,
  });
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
    close: async () => {
      await modules.close();
      await server.close();
    },
  };
};
