import { tellProblem, type Run } from './run';

/** Works out anew where program zero lies, after any change of origin, shift or length. */
export function placeProgramZero(run: Run): void {
  const { machine, offsets, tell } = run;
  tell.quiet.ask();
  const { preset, local } = offsets;
  const origin = offsets.origin(machine.workOffset);
  const { baseX, baseY } = machine;
  machine.originX = origin.x;
  machine.originY = origin.y;
  machine.originZ = origin.z;
  machine.shiftX = preset.x + local.x;
  machine.shiftY = preset.y + local.y;
  machine.shiftZ = preset.z + local.z;
  machine.baseX = (origin.x ?? 0) + machine.shiftX;
  machine.baseY = (origin.y ?? 0) + machine.shiftY;
  machine.baseZ = (origin.z ?? 0) + machine.shiftZ + machine.lengthOffset;
  machine.baseA = (origin.a ?? 0) + preset.a + local.a;
  machine.unsetAxes =
    ((origin.x === undefined ? 1 : 0) |
      (origin.y === undefined ? 2 : 0) |
      (origin.z === undefined ? 4 : 0)) &
    ~offsets.presetAxes;
  if (machine.compensation !== 'off' && (machine.baseX !== baseX || machine.baseY !== baseY))
    tellProblem(run, 'compensation-entry', undefined, { reason: 'zero-moved' });
}
