import { join } from 'node:path';
import type { Store } from '#db/store';
import { localDate } from '#shared/domain/calendar';
import { realClock, type Clock } from './clock';
import type { Config } from './config';
import { ImportDesk } from './features/imports/import-desk';
import type { Outbox } from './mail/outbox';
import { ImportThread } from './workers/import-thread';

/** The desk for sent files, with its folder, its threads, its clocks and whom it tells by mail. */
export function importDeskOf(
  store: Store,
  config: Pick<Config, 'data'>,
  clock: Clock,
  outbox: Outbox,
): ImportDesk {
  return new ImportDesk(store, {
    folder: join(config.data, 'imports'),
    reader: new ImportThread(store.file),
    now: () => realClock.now(),
    today: (timeZone) => localDate(clock.now(), timeZone),
    tellEnded: (personId, ended) => outbox.queueImportEnded(personId, ended),
  });
}
