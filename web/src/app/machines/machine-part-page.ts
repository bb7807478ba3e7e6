import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { MatSnackBar } from '@angular/material/snack-bar';
import { map } from 'rxjs';
import type { MachineDetails } from '#contracts';
import { machineSchema, offsetsSchema, rackSchema } from '#contracts';
import { CurrentUser } from '../sign-in/current-user';
import { ToolClient } from '../tools/tool-client';
import type { Keeping, Standing } from '../ui/facts/revised-facts';
import { RevisedFacts } from '../ui/facts/revised-facts';
import { SectionExtra } from '../ui/facts/section-extra';
import { RackStrip } from '../ui/rack-strip/rack-strip';
import { RevisionList } from '../ui/revision-list/revision-list';
import { TablePlan } from '../ui/table-plan/table-plan';
import type { HoldsUnsaved } from '../ui/unsaved/unsaved-guard';
import { MachineClient } from './machine-client';
import { MachineOnPage } from './machine-on-page';
import type { PartName } from './machine-parts';
import { MACHINE_PARTS } from './machine-parts';
import { PocketSpacing } from './pocket-spacing-form';

/** One part of a machine: its facts to read or change, its revisions, and the drawing they make. */
@Component({
  selector: 'nl-machine-part-page',
  imports: [PocketSpacing, RackStrip, RevisedFacts, RevisionList, SectionExtra, TablePlan],
  templateUrl: './machine-part-page.html',
  styleUrl: './machine-part-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MachinePartPage implements HoldsUnsaved {
  readonly #client = inject(MachineClient);
  readonly #snackBar = inject(MatSnackBar);
  readonly #tools = inject(ToolClient);
  readonly #user = inject(CurrentUser);
  protected readonly page = inject(MachineOnPage);

  /** From the route's data. */
  readonly part = input.required<PartName>();

  private readonly facts = viewChild(RevisedFacts);

  protected readonly units = this.#user.units;
  protected readonly about = computed(() => MACHINE_PARTS[this.part()]);
  protected readonly mayChange = computed(() => this.#user.may(this.about().may));
  protected readonly standing = computed<Standing | null>(() => {
    const machine = this.page.machine();
    return machine ? this.about().standing(machine) : null;
  });
  readonly #past = rxResource({
    params: () => {
      const machine = this.page.machine();
      const number = this.standing()?.revision?.number;
      return machine ? { id: machine.id, part: this.about().revisionsOf, number } : undefined;
    },
    stream: ({ params }) => this.#client.revisions(params.id, params.part),
  });
  protected readonly revisions = computed(() => (this.#past.hasValue() ? this.#past.value() : []));
  readonly #toolList = rxResource({
    params: () => (this.part() === 'rack' ? 'rack' : undefined),
    stream: () => this.#tools.list(),
  });
  protected readonly tools = computed(() =>
    this.#toolList.hasValue() ? this.#toolList.value().map((record) => record.tool) : [],
  );

  protected readonly typed = signal<unknown>(null);
  /** The drawing follows what is typed as long as it can be drawn, else it shows what stands. */
  protected readonly drawn = computed(() => {
    const machine = this.page.machine();
    if (!machine || this.part() === 'controller') return null;
    const typed = this.typed();
    return {
      machine:
        this.part() === 'description'
          ? typedOr(machineSchema, typed, machine.machine)
          : machine.machine,
      rack: this.part() === 'rack' ? typedOr(rackSchema, typed, machine.rack) : machine.rack,
      work:
        this.part() === 'offsets'
          ? typedOr(workSchema, typed, { work: machine.work }).work
          : machine.work,
      loading: machine.loading,
    };
  });

  protected readonly keeping = computed<Keeping>(() => {
    const about = this.about();
    return {
      validate: about.validate,
      keep: (change) =>
        about.save(this.#client, this.#machine(), change).pipe(map((saved) => this.#taken(saved))),
      fetch: () =>
        this.#client.details(this.#machine().id).pipe(
          map((newest) => {
            // Machine and controller share a revision: the other half is taken over as it now is.
            this.page.keep(newest);
            return about.standing(newest);
          }),
        ),
    };
  });

  hasUnsaved(): boolean {
    return this.facts()?.hasUnsaved() ?? false;
  }
  protected say(standing: Standing): void {
    this.#snackBar.open(`Saved as ${this.about().subject} ${standing.revision?.number ?? 1}.`);
  }

  #machine(): MachineDetails {
    const machine = this.page.machine();
    if (!machine) throw new Error('The form is only drawn with a machine');
    return machine;
  }
  #taken(saved: MachineDetails): Standing {
    this.page.keep(saved);
    return this.about().standing(saved);
  }
}

const workSchema = offsetsSchema.pick({ work: true });

function typedOr<T>(
  schema: { safeParse(value: unknown): { success: true; data: T } | { success: false } },
  typed: unknown,
  standing: T,
): T {
  const result = schema.safeParse(typed);
  return result.success ? result.data : standing;
}
