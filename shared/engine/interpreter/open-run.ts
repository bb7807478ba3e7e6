import type { Block } from '../blocks/block';
import { codeTenths, DECLARED, groupTables, TABLE_LENGTH } from '../blocks/code-groups';
import type { BlockDialect } from '../blocks/parse-block';
import type { Controller, DeclaredCode } from '../shop/setup';
import type { Shop } from '../shop/shop';
import { Broadcaster } from './broadcaster';
import { noOffset } from './compensation/offset';
import { emptyCycle } from './cycle-words';
import type { Observer } from './events';
import { hold } from './held-tool';
import { notProbed, openParameters } from './live-parameters';
import { Machine, NO_MOTION } from './machine';
import { emptyMotion } from './motions';
import { placeProgramZero } from './program-zero';
import type { Run } from './run';
import { WorkOffsets } from './work-offsets';

/** The machine and the controller as they stand before the first block. */
export function openRun(shop: Shop, block: Block, observers: readonly Observer[]): Run {
  const { controller, machine: description, loading, offsets } = shop.setup;
  const machine = new Machine(block);
  setDefaults(machine, controller);
  const { travel, start } = description;
  machine.x = start?.x ?? travel.x[0];
  machine.y = start?.y ?? travel.y[0];
  machine.z = start?.z ?? travel.z[1];
  machine.a = 0;
  const grammar = {
    isMacro: controller.language === 'custom-macro',
    isStrict: controller.switches.strict,
  };
  const known = {
    shop,
    controller,
    machine,
    offsets: new WorkOffsets(offsets),
    references: { g28: description.references.g28, g30: description.references.g30 },
    probed: notProbed(),
  };
  const run: Run = {
    ...known,
    grammar,
    parameters: openParameters(known, grammar),
    dialect: openDialect(controller),
    block,
    tell: new Broadcaster(observers, machine),
    lengths: byNumber(offsets.length),
    diameters: byNumber(offsets.diameter),
    unknown: undefined,
    movesAtBounds: false,
    offset: noOffset(),
    cycle: emptyCycle(),
    motion: emptyMotion(),
    target: { x: 0.5, y: 0.5, z: 0.5, a: 0.5 },
    circle: { u: 0.5, v: 0.5, radius: 0.5 },
    declared: groupDeclared(controller.codes),
    saved: [],
    toldUnset: new Set(),
    loneMachineMove: undefined,
    callsMade: false,
    isCalled: false,
    endedBy: '',
    refused: false,
  };
  hold(run, loading.inSpindle === 'unknown' ? null : (loading.inSpindle ?? 0));
  placeProgramZero(run);
  return run;
}

const byNumber = (table: Readonly<Record<string, number>>): Map<number, number> =>
  new Map(Object.entries(table).map(([number, mm]) => [Number(number), mm]));

function setDefaults(machine: Machine, { defaults, switches }: Controller): void {
  machine.unit = defaults.units === 'mm' ? 1 : 25.4;
  machine.planeIndex = defaults.plane === 'xy' ? 0 : defaults.plane === 'zx' ? 1 : 2;
  machine.isAbsolute = defaults.distance === 'absolute';
  machine.isArcCentreAbsolute = defaults.arcCentre === 'absolute';
  machine.feedMode = defaults.feed;
  machine.workOffset = defaults.workOffset;
  machine.returnTo = defaults.return;
  machine.path = defaults.path;
  const { startMotion } = switches;
  machine.motionCode = startMotion === 'none' ? NO_MOTION : startMotion === 'rapid' ? 0 : 10;
  machine.lengthOffset = 0;
  machine.speed = 0;
  machine.feed = NaN;
}

/** Codes the setup declares lose their built-in group; the rest are as published or, if not strict, as the trade adds. */
function openDialect(controller: Controller): BlockDialect {
  const { g, m } = groupTables(controller.switches.strict);
  for (const { code } of controller.codes) {
    const tenths = codeTenths(code);
    if (tenths < TABLE_LENGTH) (code.startsWith('G') ? g : m)[tenths] = DECLARED;
  }
  const counts = controller.numbers === 'least-increment';
  return {
    g,
    m,
    isStrict: controller.switches.strict,
    increment: counts ? controller.switches.leastIncrement : 0,
  };
}

function groupDeclared(codes: readonly DeclaredCode[]): Map<string, DeclaredCode[]> {
  const byName = new Map<string, DeclaredCode[]>();
  for (const code of codes) {
    // 'M06' and 'M6' are one code.
    const name = code.code[0]! + String(Number(code.code.slice(1)));
    const meanings = byName.get(name);
    if (meanings) meanings.push(code);
    else byName.set(name, [code]);
  }
  return byName;
}
