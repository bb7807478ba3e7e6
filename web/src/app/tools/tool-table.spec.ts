import { testTool } from '../machines/testing/test-shop';
import type { ToolQuery } from './tool-table';
import { queryTools, rowOfTool } from './tool-table';

const NOW = new Date('2026-12-01T12:00:00Z');
const PLACE = { machineId: '11111111-1111-4111-8111-111111111111', machine: 'North', pocket: 3 };
const RECORDS = [
  testTool(4, { name: '6 mm compression', diameter: 6, life: 7200, used: 1800 }),
  { ...testTool(7, { name: '3 mm ball', kind: 'ball', diameter: 3 }), places: [PLACE] },
  testTool(12, { name: '12 mm upcut', kind: 'upcut', life: 3600, used: 4200, measured: null }),
];
const ALL: ToolQuery = { search: '', kind: '', where: '', sortBy: 'number', direction: 'asc' };
const numbers = (query: Partial<ToolQuery>) =>
  queryTools(RECORDS, { ...ALL, ...query }).map((each) => each.tool.number);

describe('the tool list', () => {
  it('is found by number, name and kind, all words together', () => {
    expect(numbers({ search: 't7' })).toEqual([7]);
    expect(numbers({ search: 'mm COMP' })).toEqual([4]);
    expect(numbers({ search: 'saw' })).toEqual([]);
    expect(numbers({ kind: 'ball' })).toEqual([7]);
  });
  it('tells loaded tools from those in no pocket', () => {
    expect(numbers({ where: 'loaded' })).toEqual([7]);
    expect(numbers({ where: 'not-loaded' })).toEqual([4, 12]);
  });
  it('is sorted both ways, least life left and never measured first', () => {
    expect(numbers({ sortBy: 'diameter' })).toEqual([7, 4, 12]);
    expect(numbers({ sortBy: 'number', direction: 'desc' })).toEqual([12, 7, 4]);
    expect(numbers({ sortBy: 'life' })).toEqual([12, 4, 7]);
    expect(numbers({ sortBy: 'measured' })[0]).toBe(12);
  });
});

describe('a row of the tool list', () => {
  it('says size, life and place in words', () => {
    expect(rowOfTool(RECORDS[0]!, 'mm', NOW)).toMatchObject({
      diameter: '6 mm',
      life: '1 h 30 min of 2 h 00 min left',
      left: 0.75,
      places: 'in no pocket',
      lengthDoubt: 'none',
    });
    expect(rowOfTool(RECORDS[1]!, 'inch', NOW)).toMatchObject({
      diameter: '0.1181 in',
      life: 'not kept',
      places: 'North, pocket 3',
    });
  });
  it('says when a length does not count', () => {
    expect(rowOfTool(RECORDS[2]!, 'mm', NOW)).toMatchObject({
      measured: 'never',
      lengthDoubt: 'never',
      life: 'over by 10 min',
    });
    const touched = testTool(5, { touched: '2026-12-01T08:00:00Z' });
    expect(rowOfTool(touched, 'mm', NOW).lengthDoubt).toBe('touched-since');
  });
});
