import { setupSchema, type ValidSetup } from '#contracts';
import { StoreRefusal } from '../store-refusal';
import type { MachineStanding } from './machine-standing';

/** A tool of the shop with the table entries kept for its number. */
export interface StandingTool {
  readonly revisionId: string;
  readonly tool: ValidSetup['tools'][number];
  readonly lengthOffset: number | null;
  readonly diameterOffset: number | null;
}
export interface SetupParts {
  readonly standing: MachineStanding;
  readonly tools: readonly StandingTool[];
  readonly policy: ValidSetup['policy'];
  readonly job?: ValidSetup['job'] | undefined;
  /** The moment at which ages are judged; left out of an export, set to now for a check. */
  readonly asOf?: string | undefined;
}

/**
 * The setup document that a check holds a program against, put together from what stands on the
 * machine. Refuses parts that do not fit each other, naming the field.
 */
export function buildSetup({ standing, tools, policy, job, asOf }: SetupParts): ValidSetup {
  const { machine, controller, rack, loading, macro, subprograms } = standing;
  const checked = setupSchema.safeParse({
    format: 'nightlatch-setup',
    version: 1,
    ...(asOf === undefined ? {} : { asOf }),
    machine,
    controller,
    rack,
    loading,
    tools: tools.map((each) => each.tool).sort((one, other) => one.number - other.number),
    offsets: {
      length: lengthTable(standing, tools),
      diameter: diameterTable(standing, tools),
      work: standing.work,
    },
    ...(job === undefined ? {} : { job }),
    ...(macro === null ? {} : { changeMacro: macro }),
    subprograms,
    policy,
  });
  if (checked.success) return checked.data;
  const [issue] = checked.error.issues;
  const path = issue?.path.join('.') ?? '';
  throw new StoreRefusal(
    'unfit',
    `The parts of ${standing.name} do not fit each other: ${path}: ${issue?.message ?? 'unreadable'}.`,
    { path, issues: checked.error.issues.map(({ path, message }) => ({ path, message })) },
  );
}

/** Entries that belong to no tool stay; a tool's own entry stands under its number. */
function lengthTable(
  { length }: MachineStanding,
  tools: readonly StandingTool[],
): Record<string, number> {
  const table: Record<string, number> = { ...length };
  for (const { tool, lengthOffset } of tools) {
    if (lengthOffset !== null) table[String(tool.number)] = lengthOffset;
  }
  return table;
}

/** As for lengths, under the D number that this controller reads for the tool. */
function diameterTable(
  { diameter, controller }: MachineStanding,
  tools: readonly StandingTool[],
): Record<string, number> {
  const table: Record<string, number> = { ...diameter };
  for (const { tool, diameterOffset } of tools) {
    const number = tool.number + controller.diameterOffsetShift;
    if (diameterOffset !== null && 0 <= number) table[String(number)] = diameterOffset;
  }
  return table;
}
