import type { ProgramEndEvent } from '../interpreter/events';
import type { Controller } from '../shop/setup';

/**
 * Whether the end code puts the modes back: distance, feed mode, compensation, plane, work offset, the
 * motion mode and shifts. In the published language M2 and M30 do (NISTIR 6556, 3.6.1); on macro-style
 * controllers it depends on parameters nobody sees here, so nothing is taken for granted.
 */
export function endCodeResets(
  controller: Pick<Controller, 'language'>,
  code: ProgramEndEvent['code'],
): boolean {
  return controller.language === 'rs274ngc' && (code === 'M2' || code === 'M30');
}

/** Whether what this controller starts with is what every program leaves: its end code puts it back. */
export function startStateIsSure(controller: Pick<Controller, 'language'>): boolean {
  return endCodeResets(controller, 'M30');
}
