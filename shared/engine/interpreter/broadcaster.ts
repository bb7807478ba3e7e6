import type * as events from './events';
import { QuietWatch } from './quiet/quiet-watch';
import { MotionCalls } from './motion-calls';

type Listening<Kind extends keyof events.Observer> = Required<Pick<events.Observer, Kind>>;

/** Passes each event to the observers that listen to its kind, in their order, and to no other. */
export class Broadcaster {
  readonly quiet: QuietWatch;
  private readonly blocks: readonly Listening<'block'>[];
  private readonly motions: MotionCalls;
  private readonly problems: readonly Listening<'problem'>[];
  private readonly comments: readonly Listening<'comment'>[];
  private readonly selections: readonly Listening<'toolSelected'>[];
  private readonly changings: readonly Listening<'toolChanging'>[];
  private readonly changes: readonly Listening<'toolChanged'>[];
  private readonly spindles: readonly Listening<'spindle'>[];
  private readonly dwells: readonly Listening<'dwell'>[];
  private readonly stops: readonly Listening<'stop'>[];
  private readonly offsets: readonly Listening<'offsetChanged'>[];
  private readonly lengths: readonly Listening<'lengthOffset'>[];
  private readonly compensations: readonly Listening<'compensation'>[];
  private readonly shifts: readonly Listening<'localShift'>[];
  private readonly modals: readonly Listening<'modal'>[];
  private readonly coolants: readonly Listening<'coolant'>[];
  private readonly deeds: readonly Listening<'deed'>[];
  private readonly ends: readonly Listening<'programEnd'>[];

  constructor(
    observers: readonly events.Observer[],
    private readonly state: events.MachineState,
  ) {
    this.quiet = new QuietWatch(observers, state);
    this.blocks = listening(observers, 'block');
    this.motions = new MotionCalls(observers, state);
    this.problems = listening(observers, 'problem');
    this.comments = listening(observers, 'comment');
    this.selections = listening(observers, 'toolSelected');
    this.changings = listening(observers, 'toolChanging');
    this.changes = listening(observers, 'toolChanged');
    this.spindles = listening(observers, 'spindle');
    this.dwells = listening(observers, 'dwell');
    this.stops = listening(observers, 'stop');
    this.offsets = listening(observers, 'offsetChanged');
    this.lengths = listening(observers, 'lengthOffset');
    this.compensations = listening(observers, 'compensation');
    this.shifts = listening(observers, 'localShift');
    this.modals = listening(observers, 'modal');
    this.coolants = listening(observers, 'coolant');
    this.deeds = listening(observers, 'deed');
    this.ends = listening(observers, 'programEnd');
  }

  /** Whether anybody wants comments; if not, their text is never decoded. */
  get wantsComments(): boolean {
    return this.comments.length > 0;
  }
  get wantsModals(): boolean {
    return this.modals.length > 0;
  }

  block(): void {
    for (const each of this.blocks) each.block(this.state);
  }
  motion(motion: events.Motion): void {
    this.quiet.noteLoud(motion);
    this.motions.tell(motion);
  }
  problem(event: events.ProblemEvent): void {
    for (const each of this.problems) each.problem(event, this.state);
  }
  comment(event: events.CommentEvent): void {
    for (const each of this.comments) each.comment(event, this.state);
  }
  toolSelected(event: events.ToolSelectedEvent): void {
    this.quiet.ask();
    for (const each of this.selections) each.toolSelected(event, this.state);
  }
  toolChanging(event: events.ToolChangedEvent): void {
    this.quiet.ask();
    for (const each of this.changings) each.toolChanging(event, this.state);
  }
  toolChanged(event: events.ToolChangedEvent): void {
    this.quiet.ask();
    for (const each of this.changes) each.toolChanged(event, this.state);
  }
  spindle(event: events.SpindleEvent): void {
    this.quiet.ask();
    for (const each of this.spindles) each.spindle(event, this.state);
  }
  dwell(event: events.DwellEvent): void {
    this.quiet.ask();
    for (const each of this.dwells) each.dwell(event, this.state);
  }
  stop(event: events.StopEvent): void {
    this.quiet.ask();
    for (const each of this.stops) each.stop(event, this.state);
  }
  offsetChanged(event: events.OffsetChangedEvent): void {
    this.quiet.ask();
    for (const each of this.offsets) each.offsetChanged(event, this.state);
  }
  lengthOffset(event: events.LengthOffsetEvent): void {
    this.quiet.ask();
    for (const each of this.lengths) each.lengthOffset(event, this.state);
  }
  compensation(event: events.CompensationEvent): void {
    this.quiet.ask();
    for (const each of this.compensations) each.compensation(event, this.state);
  }
  localShift(event: events.LocalShiftEvent): void {
    this.quiet.ask();
    for (const each of this.shifts) each.localShift(event, this.state);
  }
  modal(event: events.ModalEvent): void {
    // G90 and G91 stand in the middle of what is quiet, and nothing depends on them there.
    if (event.what !== 'distance') this.quiet.ask();
    for (const each of this.modals) each.modal(event, this.state);
  }
  coolant(event: events.CoolantEvent): void {
    this.quiet.ask();
    for (const each of this.coolants) each.coolant(event, this.state);
  }
  deed(event: events.DeedEvent): void {
    this.quiet.ask();
    for (const each of this.deeds) each.deed(event, this.state);
  }
  programEnd(event: events.ProgramEndEvent): void {
    this.quiet.ask();
    for (const each of this.ends) each.programEnd(event, this.state);
  }
}

function listening<Kind extends keyof events.Observer>(
  observers: readonly events.Observer[],
  kind: Kind,
): readonly Listening<Kind>[] {
  return observers.filter(
    (each) => each[kind] !== undefined,
  ) as unknown as readonly Listening<Kind>[];
}
