import { isSameDocument } from './same-document';

describe('isSameDocument', () => {
  it('looks at what is said, not at the order of keys', () => {
    expect(isSameDocument({ a: 1, b: [{ c: 'x' }] }, { b: [{ c: 'x' }], a: 1 })).toBeTrue();
    expect(isSameDocument({ a: 1, note: undefined }, { a: 1 })).toBeTrue();
  });

  it('sees every difference', () => {
    expect(isSameDocument([1, 2], [2, 1])).toBeFalse();
    expect(isSameDocument([1], [1, 2])).toBeFalse();
    expect(isSameDocument({ a: 1 }, { a: 1, b: 2 })).toBeFalse();
    expect(isSameDocument({ a: null }, { a: undefined })).toBeFalse();
    expect(isSameDocument([], {})).toBeFalse();
    expect(isSameDocument('1', 1)).toBeFalse();
  });
});
