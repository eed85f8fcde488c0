import type { TrustedMeanInterval } from '../../stats/mean/trustedInterval.ts';
import { threeDigits } from '../../wording/digits.ts';
import { probabilityValue } from '../../wording/words.ts';
import type { Warning } from '../answer.ts';

const dependenceFound = ({ evidence }: TrustedMeanInterval): string =>
  `returns follow each other (robust test p ${probabilityValue(evidence.robustAutocorrelation?.p ?? 1)})`;

/** What speaks against reading the plain interval, what that means here and what to do. */
export const meanWarnings = (
  trusted: TrustedMeanInterval,
  leading: TrustedMeanInterval['trust'],
): readonly Warning[] => {
  const { reason, evidence } = trusted;
  switch (reason) {
    case 'nothingAgainst':
      return [];
    case 'plainTooNarrow':
      return [
        {
          code: 'dependencePlainTooNarrow',
          text: `${dependenceFound(trusted)}, so the plain interval is too narrow: read the Newey–West row.`,
        },
      ];
    case 'plainTooWide':
      return [
        {
          code: 'dependencePlainTooWide',
          text: `${dependenceFound(trusted)}, so the plain interval is too wide: read the Newey–West row.`,
        },
      ];
    case 'lopsided':
      return [
        {
          code: 'lopsided',
          text: `returns are few and lopsided (skewness ${threeDigits(evidence.skewness ?? 0)}), and the plain interval does not lean with them: read the ${leading === 'neweyWest' ? 'bootstrap row beside the Newey–West one' : 'bootstrap row'}.`,
        },
      ];
    case 'outOfReach':
      return [
        {
          code: 'trustOutOfReach',
          text: evidence.dependent
            ? `${dependenceFound(trusted)}, and under 20 returns no interval allows for that: ask for a longer window before leaning on this one.`
            : 'returns are lopsided, and under 10 returns no interval allows for that: ask for a longer window before leaning on this one.',
        },
      ];
  }
};
