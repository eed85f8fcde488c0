import type { ReadQuestion, ShapeQuestion } from '../../questions/question.ts';
import { createStreams } from '../../stats/random/xoshiro128.ts';
import { type ShapeFigures as FoundShape, shape } from '../../stats/tails/shape.ts';
import { levelFraction } from '../../terms/level.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { workingDigits } from '../../wording/digits.ts';
import { probabilityValue } from '../../wording/words.ts';
import type { Note, ShapeAnswer, Warning, WorkingStep } from '../answer.ts';
import { askOne } from '../askOne.ts';
import { enclose } from '../envelope.ts';
import type { AnswerPolicy } from '../policy.ts';
import { orInfinity } from '../tail/modelFigures.ts';
import { endsText, returnsStep } from '../working.ts';
import type { ShapeFigures } from './figures.ts';

const endOrInfinity = (value: number | null) => (value === null ? null : orInfinity(value));

const figuresOf = (found: FoundShape, confidenceLevel: number): ShapeFigures => {
  const student = found.student.ok ? found.student.value : null;
  return {
    skewness: found.skewness,
    excessKurtosis: found.excessKurtosis,
    jarqueBera: found.jarqueBera,
    jarqueBeraP: found.jarqueBeraP,
    jarqueBeraSimulatedP: found.jarqueBeraSimulatedP,
    andersonDarlingNormal: found.andersonDarlingNormal,
    andersonDarlingNormalP: found.andersonDarlingNormalP,
    andersonDarlingStudent: student?.andersonDarling ?? null,
    andersonDarlingStudentP: student?.andersonDarlingP ?? null,
    likelihoodRatio: student?.likelihoodRatio ?? null,
    likelihoodRatioP: student?.likelihoodRatioP ?? null,
    nu: student === null ? null : orInfinity(student.fit.nu),
    nuLower: student === null ? null : endOrInfinity(student.nuInterval.lower),
    nuUpper: student === null ? null : endOrInfinity(student.nuInterval.upper),
    normalLimit: student?.fit.normalLimit ?? null,
    confidenceLevel,
    tailMultiples: student?.tailMultiples ?? [],
  };
};

const notesOf = (found: FoundShape): readonly Note[] => [
  ...(found.jarqueBeraSimulatedP === null
    ? [
        {
          figure: 'jarqueBeraSimulatedP',
          code: 'notCalledFor',
          text: 'From 500 returns up the chi-square p of Jarque–Bera is good enough and no p is simulated.',
        },
      ]
    : []),
  ...(found.student.ok
    ? found.student.value.notes.map(({ figure, code, text }) => ({ figure, code, text }))
    : [{ figure: 'nu', code: found.student.problem.code, text: found.student.problem.message }]),
];

const warningsOf = (found: FoundShape): readonly Warning[] => {
  if (!found.student.ok) return [{ code: found.student.problem.code, text: found.student.problem.message }];
  const { nuInterval, andersonDarlingP } = found.student.value;
  return [
    ...(nuInterval.lower !== null && nuInterval.lower <= 2
      ? [
          {
            code: 'varianceMayNotBeFinite',
            text: 'degrees of freedom of 2 are not ruled out, and then no variance exists: volatility figures of this ticker mean little.',
          },
        ]
      : []),
    ...(andersonDarlingP < 0.05
      ? [
          {
            code: 'studentDoesNotFit',
            text: `the fitted t itself does not fit (Anderson–Darling p ${probabilityValue(andersonDarlingP)}): read historical and peaks beside it.`,
          },
        ]
      : []),
  ];
};

const studentSteps = ({ student }: FoundShape): readonly WorkingStep[] => {
  if (!student.ok) return [{ step: 'Student fit', text: student.problem.message }];
  const {
    fit,
    nuInterval,
    andersonDarling,
    andersonDarlingP,
    likelihoodRatio,
    likelihoodRatioP,
    tailMultiples,
  } = student.value;
  const upper = nuInterval.upper === Number.POSITIVE_INFINITY ? null : nuInterval.upper;
  const nu = fit.nu === Number.POSITIVE_INFINITY ? 'infinite (the bell curve)' : workingDigits(fit.nu);
  return [
    {
      step: 'Student fit by maximum likelihood',
      text: `location ${workingDigits(fit.location)}, scale ${workingDigits(fit.scale)}, degrees of freedom ${nu} (${endsText({ lower: nuInterval.lower, upper })})`,
    },
    {
      step: 'Does the t fit?',
      text: `Anderson–Darling ${workingDigits(andersonDarling)}, p ${probabilityValue(andersonDarlingP)} over 999 refitted samples`,
    },
    {
      step: 't against bell curve',
      text: `likelihood ratio ${workingDigits(likelihoodRatio)}, p = ½·P(χ² ≥ ratio) ${probabilityValue(likelihoodRatioP)}`,
    },
    {
      step: 'Tail multiples',
      text: tailMultiples
        .map(({ deviations, multiple }) => `${deviations} deviations: ${workingDigits(multiple)}`)
        .join('; '),
    },
  ];
};

/** How fat the tails are, against the bell curve. */
export const answerShape = (
  read: ReadQuestion,
  question: ShapeQuestion,
  series: PriceSeries,
  policy: AnswerPolicy,
): Result<ShapeAnswer> => {
  const asked = askOne(read, question, series, policy);
  if (!asked.ok) return asked;
  const { sample, identity } = asked.value;
  const found = shape({
    returns: sample.returns,
    confidence: question.confidence,
    streams: createStreams(identity.seedBytes),
  });
  if (!found.ok) return found;
  const value = found.value;
  return succeed(
    enclose(asked.value, {
      kind: 'shape',
      verb: 'shape',
      figures: figuresOf(value, levelFraction(question.confidence)),
      warnings: warningsOf(value),
      notes: notesOf(value),
      method: 'shape against the bell curve and the fitted t',
      sources: [
        'Jarque & Bera (1987), International Statistical Review 55',
        'Anderson & Darling (1954), Journal of the American Statistical Association 49',
        'Likelihood ratio on the boundary: Self & Liang (1987), Journal of the American Statistical Association 82',
      ],
      working: [
        returnsStep(sample, question.returnType),
        {
          step: 'Moments',
          text: `skewness ${workingDigits(value.skewness)}, excess kurtosis ${workingDigits(value.excessKurtosis)} (divisor n)`,
        },
        {
          step: 'Jarque–Bera',
          text: `${workingDigits(value.jarqueBera)}, p ${probabilityValue(value.jarqueBeraP)}${value.jarqueBeraSimulatedP === null ? '' : `, simulated p ${probabilityValue(value.jarqueBeraSimulatedP)}`}`,
        },
        {
          step: 'Does the bell curve fit?',
          text: `Anderson–Darling ${workingDigits(value.andersonDarlingNormal)}, p ${probabilityValue(value.andersonDarlingNormalP)}`,
        },
        ...studentSteps(value),
      ],
    }),
  );
};
