import { type Problem, problem } from '../../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../../terms/result.ts';
import { contradictsItsName, type FileKind, fileKindOf } from './fileKind.ts';
import { mostLineBytes, type Wholeness, wholenessOf } from './wholeness.ts';

export type AcceptedFile = { readonly kind: FileKind; readonly hasUnfinishedLine: boolean };

const refusalOf = (path: string, wholeness: Wholeness): Problem | null => {
  if (wholeness === 'cutOff') {
    return problem('fileUnreadable', `${path} ends before its own end or is damaged. Write it again.`);
  }
  if (wholeness !== 'lineTooLong') return null;
  const most = mostLineBytes.toLocaleString('en');
  return problem(
    'fileUnreadable',
    `${path} has a row longer than the ${most} bytes that a row may have. Correct the file and save it again.`,
  );
};

/** A file that can be opened, is what its name says, and is whole; or why it is none of these. */
export const acceptFile = async (path: string): Promise<Result<AcceptedFile>> => {
  const kind = fileKindOf(path);
  if (kind === null) {
    const message = `${path} has a name that says nothing of its kind. Let it end in .csv, .csv.gz, .csv.zst or .parquet.`;
    return refuse(problem('fileUnreadable', message));
  }
  try {
    const contradiction = await contradictsItsName(path, kind);
    if (contradiction !== null) return refuse(contradiction);
    const wholeness = await wholenessOf(path, kind);
    const refusal = refusalOf(path, wholeness);
    return refusal === null
      ? succeed({ kind, hasUnfinishedLine: wholeness === 'unfinishedLine' })
      : refuse(refusal);
  } catch {
    return refuse(problem('fileUnreadable', `${path} cannot be opened. Check its path and who may read it.`));
  }
};
