import { join } from 'node:path';
import type { Store } from '#db/store';
import { localDate } from '#shared/domain/calendar';
import { realClock, type Clock } from './clock';
import type { Config } from './config';
import { ImportDesk } from './features/imports/import-desk';
import { ImportThread } from './workers/import-thread';

/** The desk for sent files, with its folder, its threads and its clocks. */
export function importDeskOf(store: Store, config: Pick<Config, 'data'>, clock: Clock): ImportDesk {
  return new ImportDesk(store, {
    folder: join(config.data, 'imports'),
    reader: new ImportThread(store.file),
    now: () => realClock.now(),
    today: (timeZone) => localDate(clock.now(), timeZone),
  });
}
