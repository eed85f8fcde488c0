import { readFileSync, writeFileSync } from 'node:fs';
import { relative } from 'node:path';
import { declareFactoryPlugin, PluginKind } from '@stryker-mutator/api/plugin';
import {
  DryRunStatus,
  determineHitLimitReached,
  MutantRunStatus,
  TestStatus,
} from '@stryker-mutator/api/test-runner';
import { isDrawn } from './drawn.mjs';
import { openEnvironment } from './environment.mjs';

/**
 * Runs the statistics tests inside one process that stays: a mutant costs the tests that cover it, cheapest
 * first, up to the first that fails, instead of a worker and all its imports. Sources and tests are loaded
 * once; they keep no state between tests except what a mutant damages, so
 *
 * - a kill counts only if the killing test passes again without the mutant, or if the environment was fresh;
 *   after any other kill everything is loaded anew and the mutant is judged again;
 * - a mutant that is not killed within `millisecondsPerMutant` of tests (as timed without mutants) counts as
 *   survived, so the score is never flattered by what was not run.
 */
const millisecondsPerMutant = Number(process.env.MUTATION_BUDGET_MS ?? 2000);

/** Tests above this are left out: what only they would notice counts as survived. */
const dearestTest = Number(process.env.MUTATION_TEST_MS ?? 400);

/** Reported as an error, which no score counts. */
const notDrawn = 'not drawn';

/** Without mutants each test passes a mutated place a known number of times; this often at least it may. */
const leastHitLimit = 1_000;
const hitFactor = 100;

/** More than all of the core has. */
const mostMutants = 50_000;

const goneTest = () => {
  throw new Error('the test is no longer declared');
};

const instrumented = () => {
  globalThis.__stryker__ ??= {};
  return globalThis.__stryker__;
};

const failureOf = async (body) => {
  try {
    await body();
    return null;
  } catch (error) {
    return error instanceof Error ? error.message : String(error);
  }
};

/** What the first run learned, kept in the sandbox for the process that follows one that was ended. */
const learnedFile = '.mutation-first-run.json';

const projectRoot = () => process.cwd().split('/.stryker-tmp/')[0];

/** The texts of the mutated files as they were, by their path in the sandbox. */
const originalsOf = (files) =>
  Object.fromEntries(
    files.map((file) => {
      const path = file.startsWith(process.cwd())
        ? relative(process.cwd(), file)
        : relative(projectRoot(), file);
      return [`${process.cwd()}/${path}`, readFileSync(`${projectRoot()}/${path}`, 'utf8')];
    }),
  );

class InProcessRunner {
  environment = null;
  tests = new Map();
  learned = { testFiles: [], originals: {}, durations: {}, coverage: {} };
  /** '' for none, null for all, undefined before the first. */
  mutatedFile = undefined;
  isFresh = false;

  capabilities() {
    return { reloadEnvironment: true };
  }

  async load() {
    this.tests = await this.environment.load();
    this.isFresh = true;
  }

  /** Only the file of the mutant is mutated while it is judged; the others run as they were written. */
  async turnTo(file) {
    if (file === this.mutatedFile) return;
    this.environment.mutateOnly(file, this.learned.originals);
    this.mutatedFile = file;
    await this.load();
  }

  /** Which mutants were passed since the last look, and how often. */
  takeCounts() {
    const { counts } = instrumented();
    const passed = {};
    counts.forEach((count, mutant) => {
      if (count > 0) passed[mutant] = count;
    });
    counts.fill(0);
    return passed;
  }

  async runAll(ids) {
    const results = [];
    for (const id of ids) {
      const { name, body } = this.tests.get(id);
      const start = process.cpuUsage();
      const failureMessage = await failureOf(body);
      const { user, system } = process.cpuUsage(start);
      this.learned.coverage[id] = this.takeCounts();
      const status = failureMessage === null ? TestStatus.Success : TestStatus.Failed;
      const timeSpentMs = (user + system) / 1000;
      results.push({ id, name, timeSpentMs, status, failureMessage: failureMessage ?? '' });
    }
    return results;
  }

  /**
   * Once without mutants, which times the tests by the processor, so that a busy machine makes none dear; then those
   * that are cheap enough with all files mutated, which counts who passes which mutant.
   */
  async dryRun({ testFiles, files }) {
    instrumented().counts = new Float64Array(mostMutants);
    const quick = testFiles.filter((file) => !file.endsWith('.slow.test.ts'));
    this.learned.testFiles = quick.map((file) => relative(process.cwd(), file));
    this.learned.originals = originalsOf(files ?? []);
    this.environment = await openEnvironment(this.learned.testFiles);
    await this.turnTo('');
    const timed = await this.runAll([...this.tests.keys()]);
    const cheap = timed.filter(({ timeSpentMs }) => timeSpentMs <= dearestTest);
    for (const { id, timeSpentMs } of cheap) this.learned.durations[id] = timeSpentMs;
    await this.turnTo(null);
    const whileLoading = this.takeCounts();
    const counted = await this.runAll(cheap.map(({ id }) => id));
    const mutantCoverage = { static: whileLoading, perTest: this.learned.coverage };
    writeFileSync(learnedFile, JSON.stringify(this.learned));
    const failed = counted.some(({ status }) => status === TestStatus.Failed);
    return { status: DryRunStatus.Complete, tests: failed ? counted : timed, mutantCoverage };
  }

  async resume() {
    instrumented();
    this.learned = JSON.parse(readFileSync(learnedFile, 'utf8'));
    this.environment = await openEnvironment(this.learned.testFiles);
  }

  /** The tests that reach the mutant before the others (which only load it), cheap before dear, within the allowance. */
  chosen(mutant, isStatic) {
    const { durations, coverage } = this.learned;
    const candidates = Object.keys(durations)
      .map((id) => ({ id, cost: durations[id], hits: coverage[id]?.[mutant] ?? 0 }))
      .filter(({ hits }) => isStatic || hits > 0)
      .sort((a, b) => Number(b.hits > 0) - Number(a.hits > 0) || a.cost - b.cost);
    let spent = 0;
    return candidates.filter(({ cost }, index) => {
      spent += cost;
      return index === 0 || spent <= millisecondsPerMutant;
    });
  }

  /** The first test that fails with the mutant, or none; `endless` where the mutant was passed a hundred times as often as without it. */
  async judge({ activeMutant, reloadEnvironment, hitLimit }) {
    const stryker = instrumented();
    Object.assign(stryker, { hitCount: 0, hitLimit, activeMutant: activeMutant.id });
    let nrOfTests = 0;
    try {
      if (reloadEnvironment) await this.load();
      for (const { id, hits } of this.chosen(activeMutant.id, reloadEnvironment)) {
        nrOfTests += 1;
        const limit = hits > 0 ? leastHitLimit + hitFactor * hits : hitLimit;
        Object.assign(stryker, { hitCount: 0, hitLimit: limit });
        const body = this.tests.get(id)?.body ?? goneTest;
        const failureMessage = await failureOf(body);
        const endless = determineHitLimitReached(stryker.hitCount, limit);
        if (endless || failureMessage !== null) return { killer: id, failureMessage, nrOfTests, endless };
      }
      return { killer: null, nrOfTests };
    } catch (error) {
      return { killer: 'loading the tests', failureMessage: String(error), nrOfTests };
    } finally {
      stryker.activeMutant = undefined;
    }
  }

  async passesWithoutMutant(id) {
    const test = this.tests.get(id);
    return test !== undefined && (await failureOf(test.body)) === null;
  }

  /** Most mutants that also act while the tests are loaded fail a test that runs them; only the rest need the loading. */
  async mutantRun(options) {
    const path = relative(process.cwd(), options.sandboxFileName);
    if (!isDrawn(path, options.activeMutant))
      return { status: MutantRunStatus.Error, errorMessage: notDrawn };
    if (this.environment === null) await this.resume();
    await this.turnTo(options.sandboxFileName);
    const outcome = await this.verdict({ ...options, reloadEnvironment: false });
    return options.reloadEnvironment && outcome.status === MutantRunStatus.Survived
      ? this.verdict(options)
      : outcome;
  }

  async verdict(options) {
    const { reloadEnvironment } = options;
    for (;;) {
      const wasFresh = this.isFresh || reloadEnvironment;
      this.isFresh = false;
      const { killer, failureMessage, nrOfTests, endless } = await this.judge(options);
      const isSound = !reloadEnvironment && (killer === null || (await this.passesWithoutMutant(killer)));
      if (!isSound) await this.load();
      if (!isSound && !wasFresh) continue;
      if (endless) return { status: MutantRunStatus.Timeout, reason: endless.reason };
      if (killer === null) return { status: MutantRunStatus.Survived, nrOfTests };
      return { status: MutantRunStatus.Killed, killedBy: [killer], failureMessage, nrOfTests };
    }
  }

  async dispose() {
    await this.environment?.close();
  }
}

const createRunner = () => new InProcessRunner();
createRunner.inject = [];

export const strykerPlugins = [declareFactoryPlugin(PluginKind.TestRunner, 'in-process', createRunner)];
