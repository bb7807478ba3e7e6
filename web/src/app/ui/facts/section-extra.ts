import { Directive, TemplateRef, inject, input } from '@angular/core';
import type { FactForm } from './fact-form';

export interface ExtraContext {
  readonly $implicit: FactForm;
  /** What the form says at this moment, wrong figures left out. */
  readonly value: Readonly<Record<string, unknown>>;
}

/** Something a page adds at the foot of one section of the form, by the section's title. */
@Directive({ selector: 'ng-template[nlSectionExtra]' })
export class SectionExtra {
  readonly template = inject<TemplateRef<ExtraContext>>(TemplateRef);
  readonly nlSectionExtra = input.required<string>();

  /** So that templates know what `let-form` and `let-value` hold. */
  static ngTemplateContextGuard(_extra: SectionExtra, _context: unknown): _context is ExtraContext {
    return true;
  }
}
