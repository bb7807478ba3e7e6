import { changed, listParams, readListQuery } from './list-query';

describe('readListQuery', () => {
  it('reads the address', () => {
    const query = readListQuery({ search: 'door', verdict: 'held', offset: '50', sort: 'name' });
    expect(query).toMatchObject({ search: 'door', verdict: 'held', offset: 50, sort: 'name' });
  });
  it('falls back to the plain list when the address cannot be read', () => {
    expect(readListQuery({ sort: 'colour' })).toEqual(readListQuery({}));
  });
});

describe('listParams', () => {
  it('leaves out what is as usual', () => expect(listParams(readListQuery({}))).toEqual({}));
  it('reads back as the same query', () => {
    const query = readListQuery({ search: 'door', sort: 'lines', direction: 'asc', limit: '50' });
    expect(readListQuery(listParams(query))).toEqual(query);
  });
});

describe('changed', () => {
  const third = readListQuery({ offset: '50' });
  it('goes back to the first page when something else is sought', () => {
    expect(changed(third, { search: 'door' }).offset).toBe(0);
  });
  it('turns the page', () => expect(changed(third, { offset: 75 }).offset).toBe(75));
});
