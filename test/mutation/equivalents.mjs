/**
 * Mutants that no test can tell from the source, each group with its reason. A mutant is given as its file below
 * `src/stats`, a piece of the mutated line, the kind and the replacement.
 */
const groups = [
  {
    reason: 'on a threshold between real numbers, which no sample meets exactly',
    mutants: [
      ['mean/evidence.ts', 'dependent: robust.p', 'EqualityOperator', 'robust.p <= dependenceFoundBelow'],
      [
        'mean/evidence.ts',
        'Math.abs(lopsidedness)',
        'EqualityOperator',
        'Math.abs(lopsidedness) >= remarkableSkewness(count)',
      ],
      [
        'mean/prediction.ts',
        'excessKurtosis(returns)',
        'EqualityOperator',
        'excessKurtosis(returns) >= remarkableKurtosis(returns.length)',
      ],
      [
        'mean/trustedInterval.ts',
        'const tooNarrow',
        'EqualityOperator',
        'neweyWest.standardError >= plain.standardError',
      ],
      ['claims/claimOnMean.ts', 'const dependent', 'EqualityOperator', 'p <= dependenceFoundBelow'],
      [
        'comparisons/deviationRatio.ts',
        'volatilityClustering(returns).p',
        'EqualityOperator',
        'volatilityClustering(returns).p <= dependenceFoundBelow',
      ],
      [
        'backtests/dieboldMariano.ts',
        'robustAutocorrelation(differences).p',
        'EqualityOperator',
        'robustAutocorrelation(differences).p <= dependenceFoundBelow',
      ],
      ['samples/returnsForHalfWidth.ts', 'guess > mostSearched', 'EqualityOperator', 'guess >= mostSearched'],
      ['samples/returnsForPower.ts', 'guess > mostSearched', 'EqualityOperator', 'guess >= mostSearched'],
      [
        'samples/returnsForHalfWidth.ts',
        'criticalT(level, side, count - 1)',
        'EqualityOperator',
        'criticalT(level, side, count - 1) < widthInDeviations * Math.sqrt(count)',
      ],
      [
        'samples/returnsForPower.ts',
        'meanTestPower(',
        'EqualityOperator',
        'meanTestPower(differenceInDeviations * Math.sqrt(count), count - 1, test) > wanted',
      ],
    ],
  },
  {
    reason: 'the excess kurtosis of four returns is at most −2/3 and never remarkable',
    mutants: [
      [
        'mean/prediction.ts',
        'excessKurtosis(returns)',
        'EqualityOperator',
        'returns.length > leastCounts.kurtosis',
      ],
    ],
  },
  {
    reason: 'null only tells the type; |null| is 0 and above no threshold',
    mutants: [['mean/evidence.ts', 'lopsidedness !== null &&', 'ConditionalExpression', 'true']],
  },
  {
    reason: 't* does not depend on the scale',
    mutants: [
      [
        'mean/studentisedBootstrap.ts',
        'const scaled',
        'ArithmeticOperator',
        'deviation * sampleStandardDeviation',
      ],
    ],
  },
  {
    reason: 'where the surplus is 0 at 0, the search finds 0 as well',
    mutants: [
      ['claims/claimOnRatio.ts', 'if (surplus(0)', 'EqualityOperator', 'surplus(0) > 0'],
      ['samples/power.ts', 'if (surplus(0)', 'EqualityOperator', 'surplus(0) > 0'],
    ],
  },
  {
    reason: 'only where the search begins; the root is the same',
    mutants: [
      ['claims/claimOnRatio.ts', 'expandBracket(surplus', 'ArithmeticOperator', '3 * Math.sqrt(test.count)'],
      ['claims/claimOnRatio.ts', 'expandBracket(surplus', 'ObjectLiteral', '{}'],
      ['samples/power.ts', 'expandBracket(surplus', 'ObjectLiteral', '{}'],
      ['samples/returnsForHalfWidth.ts', 'const guess', 'ArithmeticOperator', 'normal * widthInDeviations'],
      ['samples/returnsForPower.ts', 'const guess', 'ArithmeticOperator', 'reach * differenceInDeviations'],
      ['samples/internal/smallestCount.ts', 'let short = enough - 1', 'ArithmeticOperator', 'enough + 1'],
    ],
  },
  {
    reason: 'the formula only saves the search, which finds the same count',
    mutants: [
      ['samples/returnsForHalfWidth.ts', 'guess > mostSearched', 'ConditionalExpression', 'false'],
      ['samples/returnsForPower.ts', 'guess > mostSearched', 'ConditionalExpression', 'false'],
      ['samples/returnsForHalfWidth.ts', 'if (normal <= 0)', 'EqualityOperator', 'normal < 0'],
    ],
  },
  {
    reason:
      'never taken: the power rises continuously to 1, so the search ends; the branch guards against a bug',
    mutants: [
      ['claims/claimOnRatio.ts', 'const outcome = bracket === null', 'ConditionalExpression', 'false'],
      ['claims/claimOnRatio.ts', 'if (outcome === null', 'ConditionalExpression', 'false'],
      [
        'claims/claimOnRatio.ts',
        'if (outcome === null',
        'LogicalOperator',
        'outcome === null && !outcome.found',
      ],
      ['claims/claimOnRatio.ts', 'throw new Error', 'StringLiteral', '""'],
      ['samples/power.ts', 'const outcome = bracket === null', 'ConditionalExpression', 'false'],
      ['samples/power.ts', 'if (outcome === null', 'ConditionalExpression', 'false'],
      ['samples/power.ts', 'if (outcome === null', 'LogicalOperator', 'outcome === null && !outcome.found'],
      ['samples/power.ts', 'throw new Error', 'StringLiteral', '""'],
    ],
  },
  {
    reason: 'never taken: what would be refused here was refused just before',
    mutants: [
      ['claims/claimOnRatio.ts', 'if (!interval.ok)', 'ConditionalExpression', 'false'],
      ['samples/need.ts', 'if (!deviation.ok)', 'ConditionalExpression', 'false'],
    ],
  },
  {
    reason: 'one place further a typed array takes no value, and nothing else is written',
    mutants: [
      ['backtests/shortfall.ts', 'day < losses.length', 'EqualityOperator', 'day <= losses.length'],
      ['volatility/garch.ts', 'day < values.length', 'EqualityOperator', 'day <= values.length'],
      ['volatility/internal/variancePath.ts', 'day < h.length', 'EqualityOperator', 'day <= h.length'],
    ],
  },
  {
    reason: 'an entry of the diagonal is copied onto itself',
    mutants: [
      ['volatility/internal/garchDerivatives.ts', 'column < row', 'EqualityOperator', 'column <= row'],
    ],
  },
  {
    reason: 'a climb from nearby only saves the search, which ends at the same maximum',
    mutants: [
      ['volatility/garch.ts', 'if (near?.clustering === true)', 'BlockStatement', '{}'],
      ['volatility/garch.ts', 'near.beta ?? 0', 'LogicalOperator', 'near.beta && 0'],
    ],
  },
  {
    reason: 'on the threshold between two formulas that agree there',
    mutants: [
      [
        'volatility/internal/densitySlopes.ts',
        'inverseNu < productsFrom',
        'EqualityOperator',
        'inverseNu <= productsFrom',
      ],
      [
        'distributions/internal/studentQuantile.ts',
        'const below1',
        'EqualityOperator',
        'central <= centralProbability(1, nu)',
      ],
    ],
  },
  {
    reason: 'only where Newton’s steps begin, or how many there are; the bracket ends at the same double',
    mutants: [
      ['distributions/internal/finishQuantile.ts', 'let x = start', 'ArithmeticOperator', '(low + high) * 2'],
      ['distributions/internal/finishQuantile.ts', 'let x = start', 'EqualityOperator', 'start >= low'],
      ['distributions/internal/finishQuantile.ts', 'let x = start', 'EqualityOperator', 'start <= high'],
      [
        'distributions/internal/studentQuantile.ts',
        'slope: (t) => studentDensity',
        'ArrowFunction',
        '() => undefined',
      ],
      ['distributions/chiSquare.ts', 'const given = p < 1', 'ConditionalExpression', 'true'],
      ['distributions/chiSquare.ts', 'const given = p < 1', 'EqualityOperator', 'p <= 1'],
      ['distributions/chiSquare.ts', 'if (given > 0', 'ConditionalExpression', 'true'],
      [
        'distributions/chiSquare.ts',
        'if (given > 0',
        'EqualityOperator',
        'given <= Number.POSITIVE_INFINITY',
      ],
    ],
  },
  {
    reason: 'where a series stops: the further term is below the last digit',
    mutants: [
      [
        'distributions/internal/studentTail.ts',
        'if (term < 1e-17 * sum)',
        'EqualityOperator',
        'term <= 1e-17 * sum',
      ],
      ['distributions/internal/incompleteBeta.ts', 'n < 1_000_000', 'EqualityOperator', 'n <= 1_000_000'],
      [
        'distributions/internal/noncentralIntegral.ts',
        'Math.abs(term) < 1e-18 * sum',
        'EqualityOperator',
        'Math.abs(term) <= 1e-18 * sum',
      ],
    ],
  },
  {
    reason: 'of equal means either may be the best: losses identical to its own have no p',
    mutants: [
      ['backtests/league.ts', 'lowest === null || mean < lowest', 'EqualityOperator', 'mean <= lowest'],
    ],
  },
];

export const equivalents = groups.flatMap(({ reason, mutants }) =>
  mutants.map(([file, line, mutator, replacement]) => ({
    file: `src/stats/${file}`,
    line,
    mutator,
    replacement,
    reason,
  })),
);

/** Mutants that never end although no counter sees it: nothing mutated lies inside the loop. By reading. */
export const endlessLoops = [
  {
    file: 'src/stats/samples/returnsForHalfWidth.ts',
    line: '(count) => criticalT(',
    mutator: 'ArrowFunction',
    replacement: '() => undefined',
  },
  {
    file: 'src/stats/samples/returnsForPower.ts',
    line: '(count) => meanTestPower(',
    mutator: 'ArrowFunction',
    replacement: '() => undefined',
  },
  {
    file: 'src/stats/samples/internal/smallestCount.ts',
    line: 'while (!isEnough(enough))',
    mutator: 'BlockStatement',
    replacement: '{}',
  },
];
