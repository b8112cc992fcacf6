import type { EnvironmentProviders, Provider } from '@angular/core';
import { MatIconRegistry } from '@angular/material/icon';
import { FakeMatIconRegistry } from '@angular/material/icon/testing';
import { provideRouter } from '@angular/router';
import { type DraftShelf, DRAFT_SHELVES, memoryShelf } from '../../core/drafts/draft-shelf';
import { LOCAL_STORAGE } from '../../core/settings/settings';
import { READER_LOCALE } from '../../core/settings/reader-locale';
import { provideHttpForSpec } from '../../core/testing/provide-http';
import { MemoryStorage } from '../../core/testing/memory-storage';
import { DesignStore } from '../design-store';
import { BarWork } from '../journey/bar-work';
import { StepWork } from '../journey/step-work';
import { DesignKeeper } from '../keeping/design-keeper';
import { DraftWriter } from '../keeping/draft-writer';
import { LayerWork } from '../twin/layer-work';

/** What the parts of the editor need around them: a store, work on it, a metric reader, a shelf that forgets. */
export function provideEditorForSpec(shelf: DraftShelf = memoryShelf()): (EnvironmentProviders | Provider)[] {
  return [
    provideHttpForSpec(),
    provideRouter([]),
    { provide: MatIconRegistry, useClass: FakeMatIconRegistry },
    { provide: DRAFT_SHELVES, useValue: () => Promise.resolve(shelf) },
    { provide: LOCAL_STORAGE, useValue: new MemoryStorage() },
    { provide: READER_LOCALE, useValue: 'en-GB' },
    BarWork,
    DesignKeeper,
    DesignStore,
    DraftWriter,
    LayerWork,
    StepWork,
  ];
}
