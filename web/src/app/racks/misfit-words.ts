import type { Units } from '#contracts';
import { wordFigure } from '../ui/facts/measure';
import type { Misfit } from './pocket-fit';

/** A misfit in a sentence with its figures, in the person's unit. */
export function wordMisfit(misfit: Misfit, units: Units): string {
  const { is, limit, other } = misfit.data;
  const length = (figure: number) => wordFigure(figure, 'length', units);
  switch (misfit.what) {
    case 'taper':
      return misfit.words ?? 'Its taper does not fit.';
    case 'wide':
      return `Too wide: ${length(is)}, and the pocket takes ${length(limit)}.`;
    case 'long':
      return `Too long: ${length(is)}, and the pocket takes ${length(limit)}.`;
    case 'heavy':
      return `Heavy: ${wordFigure(is, 'mass', units)}, and the pocket carries ${wordFigure(limit, 'mass', units)}.`;
    case 'neighbour':
      return `Meets T${other}: they need ${length(is)} between their axes and stand ${length(limit)} apart.`;
  }
}
