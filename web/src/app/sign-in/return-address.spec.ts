import { returnAddress } from './return-address';

describe('returnAddress', () => {
  it('brings a person back to the page they left', () => {
    expect(returnAddress('/programs?search=door')).toBe('/programs?search=door');
  });
  it.each([undefined, '', 'https://elsewhere.example', '//elsewhere.example', '/\\elsewhere'])(
    'goes to the bench rather than to %s',
    (then) => expect(returnAddress(then)).toBe('/bench'),
  );
  it('does not return to the sign-in page itself', () => {
    expect(returnAddress('/sign-in?then=%2Fbench')).toBe('/bench');
  });
});
