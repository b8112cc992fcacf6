import { TestBed } from '@angular/core/testing';
import { READER_LOCALE } from '../settings/reader-locale';
import { LOCAL_STORAGE } from '../settings/settings';
import { MemoryStorage } from '../testing/memory-storage';
import { UnitsStore } from './units-store';

function storeFor(locale: string, storage: Storage | null): UnitsStore {
  TestBed.resetTestingModule();
  TestBed.configureTestingModule({
    providers: [
      { provide: READER_LOCALE, useValue: locale },
      { provide: LOCAL_STORAGE, useValue: storage },
    ],
  });
  return TestBed.inject(UnitsStore);
}

describe('UnitsStore', () => {
  it('begins with what is usual where the reader is', () => {
    expect(storeFor('en-US', null).system()).toBe('inch');
    expect(storeFor('de-DE', null).system()).toBe('mm');
  });

  it('writes every figure in the chosen system at once', () => {
    const units = storeFor('de-DE', null);
    expect(units.format().length(2.4)).toBe('2.4 mm');
    units.choose('inch');
    // 3/32 in = 2.38125 mm, exactly.
    expect(units.format().length(2.38125)).toBe('3/32 in');
  });

  it('remembers the choice', () => {
    const storage = new MemoryStorage();
    storeFor('de-DE', storage).choose('inch');
    expect(storeFor('de-DE', storage).system()).toBe('inch');
  });

  it('does without storage that is closed to it or holds nonsense', () => {
    const closed = new MemoryStorage();
    spyOn(closed, 'getItem').and.throwError('closed');
    spyOn(closed, 'setItem').and.throwError('full');
    const units = storeFor('de-DE', closed);
    expect(() => units.choose('inch')).not.toThrow();
    expect(units.system()).toBe('inch');

    const nonsense = new MemoryStorage();
    nonsense.setItem('layerwright.units', 'cubits');
    expect(storeFor('de-DE', nonsense).system()).toBe('mm');
  });
});
