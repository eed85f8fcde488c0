import { nextStudentT } from '../../../random/studentDraw.ts';
import { fitStudent, type StudentParameters } from '../../studentFit.ts';
import type { HorizonModel, PathSource } from './pathSource.ts';

const student =
  ({ location, scale, nu }: StudentParameters): PathSource =>
  (random, into) => {
    for (let day = 0; day < into.length; day += 1) into[day] = location + scale * nextStudentT(random, nu);
  };

/** Student days; a parameter draw is the fit to as many days of the fitted distribution. */
export const studentHorizon = (count: number, parameters: StudentParameters): HorizonModel => {
  const paths = student(parameters);
  const sample = new Float64Array(count);
  return {
    paths,
    drift: parameters.location,
    lossHasMean: parameters.nu > 1,
    redraw: (random) => {
      paths(random, sample);
      const fit = fitStudent(sample, parameters);
      return fit.ok ? student(fit.value) : null;
    },
  };
};
