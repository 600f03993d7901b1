import { formatCount, formatShare, formatShareRange } from '../ui/format';
import type { Column } from '../ui/data-table/column';
import { SIDE_NAMES, ZONE_NAMES } from '../ui/words';
import { TOO_FEW } from './place-words';
import type { UndersideArea } from './underside-input';

/** The map as a table: a row an area. */
export const MAP_COLUMNS: readonly Column<UndersideArea>[] = [
  {
    key: 'zone',
    label: 'Zone',
    text: ({ zone }) => ZONE_NAMES[zone],
    sortBy: ({ zone }) => ZONE_NAMES[zone],
  },
  {
    key: 'side',
    label: 'Side',
    text: ({ side }) => SIDE_NAMES[side],
    sortBy: ({ side }) => SIDE_NAMES[side],
  },
  {
    key: 'cars',
    label: 'Cars',
    kind: 'number',
    text: ({ cars }) => formatCount(cars),
    sortBy: ({ cars }) => cars,
  },
  {
    key: 'rot',
    label: 'Rot',
    kind: 'number',
    text: ({ withRot }) => (withRot === undefined || withRot === null ? '' : formatCount(withRot)),
    sortBy: ({ withRot }) => withRot ?? null,
  },
  {
    key: 'share',
    label: 'Share',
    kind: 'number',
    text: ({ share }) => (share === null ? TOO_FEW : formatShare(share)),
    sortBy: ({ share }) => share,
    strong: true,
  },
  {
    key: 'interval',
    label: '95\u202f%',
    kind: 'number',
    text: ({ lower, upper }) =>
      lower === undefined || lower === null || upper === undefined || upper === null
        ? ''
        : formatShareRange(lower, upper),
  },
];
