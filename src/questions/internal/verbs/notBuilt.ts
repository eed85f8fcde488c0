import type { ReadContext } from '../../context.ts';
import type { Complaint } from '../recognisers/recogniser.ts';
import { languageVerbs } from './verbWords.ts';

/** Said of a verb that is known to the language but cannot be answered now. */
export const cannotBeAskedYet = (context: ReadContext, instead: readonly string[]): Complaint => {
  const built = languageVerbs.filter((verb) => context.builtVerbs.includes(verb));
  return {
    code: 'verbNotBuilt',
    says: `cannot be asked yet. What can be asked: ${built.join(', ')}.`,
    instead,
  };
};
