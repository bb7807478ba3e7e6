import type { MachineDetails, ToolRecord, Units, ValidSetup } from '#contracts';
import { wordDifferences } from '../racks/loading-words';
import { TABLE_SECTIONS, TOOL_SECTIONS } from '../tools/tool-fields';
import { differencesOf, isSame } from '../ui/facts/differences';
import { wordDifference } from '../ui/facts/difference-words';
import type { FactField } from '../ui/facts/fact-field';
import { fieldsOf } from '../ui/facts/fact-field';
import { CONTROLLER_SECTIONS } from './controller-fields';
import { MACHINE_SECTIONS } from './machine-fields';
import { OFFSET_SECTIONS } from './offset-fields';
import { RACK_SECTIONS } from './rack-fields';

/** What an import would change in one part, in sentences; none: it stays at its revision. */
export interface PartSummary {
  readonly title: string;
  readonly changes: readonly string[];
}
export interface SetupSummary {
  readonly parts: readonly PartSummary[];
  /** Tools that the shop has under the same number with other figures. */
  readonly differingTools: readonly PartSummary[];
  readonly newTools: readonly string[];
}

/** What the file says against what stands, or, for a new machine, what it brings. */
export function summarizeSetup(
  setup: ValidSetup,
  standing: MachineDetails | null,
  records: readonly ToolRecord[],
  units: Units,
): SetupSummary {
  const byNumber = new Map(records.map((record) => [record.tool.number, record]));
  const newTools = setup.tools
    .filter((tool) => !byNumber.has(tool.number))
    .map((tool) => `T${tool.number} ${tool.name}`);
  const differingTools = setup.tools.flatMap((tool) => {
    const record = byNumber.get(tool.number);
    if (!record) return [];
    const changes = wordChanges(
      { ...record.tool, ...tableOf(record) },
      { ...tool, ...entriesOf(tool.number, setup) },
      fieldsOf([...TOOL_SECTIONS, ...TABLE_SECTIONS]),
      units,
    );
    return changes.length === 0 ? [] : [{ title: `T${tool.number} ${tool.name}`, changes }];
  });
  const parts = standing ? changedParts(setup, standing, units) : broughtParts(setup);
  return { parts, differingTools, newTools };
}

function changedParts(
  setup: ValidSetup,
  standing: MachineDetails,
  units: Units,
): readonly PartSummary[] {
  const names = new Map(setup.tools.map((tool) => [tool.number, tool]));
  const part = (title: string, was: unknown, is: unknown, fields: readonly FactField[]) => ({
    title,
    changes: wordChanges(was, is, fields, units),
  });
  const macro = setup.changeMacro ?? null;
  return [
    part('Machine', standing.machine, setup.machine, fieldsOf(MACHINE_SECTIONS)),
    part('Controller', standing.controller, setup.controller, fieldsOf(CONTROLLER_SECTIONS)),
    part('Rack', standing.rack, setup.rack, fieldsOf(RACK_SECTIONS)),
    { title: 'Loading', changes: wordDifferences(standing.loading, setup.loading, names) },
    part(
      'Work offsets',
      { work: standing.work },
      { work: setup.offsets.work },
      fieldsOf(OFFSET_SECTIONS),
    ),
    { title: 'Change macro', changes: wordMacro(standing.macro, macro) },
  ];
}

function broughtParts(setup: ValidSetup): readonly PartSummary[] {
  const { machine, rack, loading, offsets } = setup;
  return [
    { title: 'Machine', changes: [machine.name] },
    { title: 'Rack', changes: [`${rack.pockets.length} pockets on the ${rack.edge} edge`] },
    { title: 'Loading', changes: [`${loading.pockets.length} pockets loaded`] },
    { title: 'Work offsets', changes: [Object.keys(offsets.work).join(', ') || 'none'] },
    { title: 'Change macro', changes: [setup.changeMacro?.name ?? 'none'] },
  ];
}

function wordMacro(was: MachineDetails['macro'], is: MachineDetails['macro']): readonly string[] {
  if (isSame(was, is)) return [];
  if (!is) return ['The file has none: the macro is taken away.'];
  const lines = is.text.split('\n').length;
  return [`${is.name}, ${lines} lines${was ? `, in place of ${was.name}` : ''}.`];
}

function wordChanges(
  was: unknown,
  is: unknown,
  fields: readonly FactField[],
  units: Units,
): readonly string[] {
  return differencesOf(was, is).map((each) => wordDifference(each, fields, units));
}

function tableOf({ lengthOffset, diameterOffset }: ToolRecord) {
  return { lengthOffset, diameterOffset };
}
/** A file keeps table entries by number; the shop keeps those of a tool with the tool. */
function entriesOf(number: number, { offsets, controller }: ValidSetup) {
  return {
    lengthOffset: offsets.length[String(number)] ?? null,
    diameterOffset: offsets.diameter[String(number + controller.diameterOffsetShift)] ?? null,
  };
}
