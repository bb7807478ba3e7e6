import { z } from 'zod';
import { controllerSchema, machineSchema, offsetsSchema, rackSchema, toolSchema } from '#contracts';
import type { FactField, FactSection } from '../ui/facts/fact-field';
import { TOOL_SECTIONS } from '../tools/tool-fields';
import { CONTROLLER_SECTIONS } from './controller-fields';
import { MACHINE_SECTIONS } from './machine-fields';
import { OFFSET_SECTIONS } from './offset-fields';
import { RACK_SECTIONS } from './rack-fields';

interface Json {
  readonly type?: unknown;
  readonly properties?: Readonly<Record<string, Json>>;
  readonly items?: Json;
  readonly anyOf?: readonly Json[];
  readonly additionalProperties?: Json | boolean;
}

/** Every path of a contract that a person has to be able to fill in. */
function pathsOf(schema: Json, path = ''): string[] {
  if (schema.anyOf) {
    const some = schema.anyOf.filter((each) => each.type !== 'null');
    return [...new Set(some.flatMap((each) => pathsOf(each, path)))];
  }
  if (schema.properties) {
    return Object.entries(schema.properties).flatMap(([key, each]) =>
      pathsOf(each, path === '' ? key : `${path}.${key}`),
    );
  }
  if (schema.items && schema.items.properties) return pathsOf(schema.items, `${path}[]`);
  if (typeof schema.additionalProperties === 'object') {
    return pathsOf(schema.additionalProperties, `${path}{}`);
  }
  return [path];
}

function fieldPaths(fields: readonly FactField[], path = ''): string[] {
  return fields.flatMap((field) => {
    const at = path === '' ? field.key : `${path}.${field.key}`;
    switch (field.type) {
      case 'group':
        return fieldPaths(field.fields, at);
      case 'list':
        return fieldPaths(field.fields, `${at}[]`);
      case 'map':
        return field.value.type === 'group'
          ? fieldPaths(field.value.fields, `${at}{}`)
          : [`${at}{}`];
      case 'box':
        return ['min', 'max'].flatMap((side) =>
          ['x', 'y', 'z'].map((axis) => `${at}.${side}.${axis}`),
        );
      default:
        return [at];
    }
  });
}
const fieldsOf = (sections: readonly FactSection[]) => sections.flatMap((each) => each.fields);

describe('the forms of the shop', () => {
  const work = z.strictObject({ work: offsetsSchema.shape.work });
  it.each([
    ['machine', machineSchema, MACHINE_SECTIONS],
    ['controller', controllerSchema, CONTROLLER_SECTIONS],
    ['rack', rackSchema, RACK_SECTIONS],
    ['tool', toolSchema, TOOL_SECTIONS],
    ['work offsets', work, OFFSET_SECTIONS],
  ] as const)('have a field for every key of the contract: %s', (_name, schema, sections) => {
    const contract = pathsOf(z.toJSONSchema(schema, { io: 'input' }) as Json);
    expect(fieldPaths(fieldsOf(sections)).sort()).toEqual(contract.sort());
  });

  it('offer exactly the choices of the contract', () => {
    const allowed = new Map<string, unknown>();
    const collect = (schema: Record<string, unknown>, path: string): void => {
      if (Array.isArray(schema['enum'])) allowed.set(path, schema['enum']);
      for (const [key, each] of Object.entries((schema['properties'] ?? {}) as object)) {
        collect(each as Record<string, unknown>, `${path}.${key}`);
      }
      if (schema['items']) collect(schema['items'] as Record<string, unknown>, path);
    };
    collect(z.toJSONSchema(controllerSchema, { io: 'input' }), 'controller');
    collect(z.toJSONSchema(machineSchema, { io: 'input' }), 'machine');
    collect(z.toJSONSchema(rackSchema, { io: 'input' }), 'rack');
    collect(z.toJSONSchema(toolSchema, { io: 'input' }), 'tool');

    const offered = new Map<string, unknown>();
    const offer = (fields: readonly FactField[], path: string): void => {
      for (const field of fields) {
        const at = `${path}.${field.key}`;
        if (field.type === 'choice' || field.type === 'several') {
          offered.set(
            at,
            field.choices.map((each) => each.value),
          );
        }
        if (field.type === 'group' || field.type === 'list') offer(field.fields, at);
      }
    };
    offer(fieldsOf(CONTROLLER_SECTIONS), 'controller');
    offer(fieldsOf(MACHINE_SECTIONS), 'machine');
    offer(fieldsOf(RACK_SECTIONS), 'rack');
    offer(fieldsOf(TOOL_SECTIONS), 'tool');
    const sorted = (map: Map<string, unknown>) =>
      [...map]
        .map(([key, values]) => `${key}: ${(values as string[]).toSorted().join(' ')}`)
        .sort();
    expect(sorted(offered)).toEqual(sorted(allowed));
  });
});
