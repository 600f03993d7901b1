import type { Zone } from '#shared/domain/vocabulary';
import { box } from './outline';

/**
 * The zones that a car has on both sides, as they lie on its left. Drawn by hand from how cars are commonly built (common
 * practice, no source): arches round the wheels, sills between them, rails either side of the tunnel.
 */
export const SIDED_PATHS = {
  front_wing: [
    'M28 98 C28 78 38 56 56 42 C86 24 140 16 205 14 C250 13 290 13 322 14 C326 14 327 16 327 19 L327 44 L305 44 L305 33 C305 25 301 22 293 22 L154 24 C124 25 102 38 101 58 C94 62 83 72 74 90 C68 101 60 106 47 106 C35 106 28 104 28 98 Z',
  ],
  front_arch: [
    'M146 28 L288 26 C297 26 302 30 302 39 L302 86 C302 98 294 105 282 105 L126 105 C112 105 105 97 105 85 L105 66 C105 43 122 29 146 28 Z',
  ],
  bulkhead_drain: [box(305, 47, 24, 50, 6)],
  sill_outer: [box(331, 25, 384, 14, 4)],
  sill_inner: [box(342, 42, 368, 13, 4)],
  floor: [
    box(338, 58, 368, 32, 4),
    'M352 113 L662 113 C684 113 708 122 708 138 L708 154 C708 160 704 164 698 164 L350 164 C344 164 341 161 341 155 L341 124 C341 117 345 113 352 113 Z',
  ],
  jacking_point: [box(356, 28, 28, 24, 5), box(664, 28, 28, 24, 5)],
  chassis_rail: [
    'M61 109 L284 109 C310 109 322 93 348 93 L674 93 C700 93 706 109 732 109 L942 109 L942 125 L728 125 C704 125 692 110 668 110 L352 110 C330 110 316 125 288 125 L61 125 Z',
  ],
  rear_arch: [
    'M724 14 C774 9 838 9 872 13 C904 17 930 29 944 46 C950 54 946 62 937 61 C916 59 899 64 897 82 L896 88 C895 100 888 106 876 106 L738 106 C725 106 719 99 719 88 L719 21 C719 16 720 14 724 14 Z',
  ],
  door_bottom: [box(331, 13, 190, 9, 3), box(525, 13, 190, 9, 3)],
} as const satisfies Partial<Record<Zone, readonly string[]>>;

/** The zones on the middle of the car: their left half, from the middle line round to the middle line. */
export const MIDDLE_HALVES = {
  slam_panel: 'M25 195 C25 166 27 142 31 127 C33 119 46 119 46 128 L46 195',
  front_subframe:
    'M138 195 L138 148 C138 135 146 128 158 128 L178 128 C189 128 189 142 202 142 L230 142 C243 142 243 128 254 128 L276 128 C288 128 296 135 296 148 L296 195',
  rear_subframe:
    'M757 195 C757 176 759 159 753 137 C751 131 755 128 761 128 L779 128 C790 128 789 140 801 140 L823 140 C835 140 834 128 845 128 L859 128 C865 128 868 131 867 137 C861 159 863 176 863 195',
  boot_floor:
    'M870 195 L870 134 C870 130 873 128 877 128 L922 128 C934 128 942 136 942 149 L942 195',
  tailgate: 'M957 195 L957 82 C957 73 966 72 970 81 C979 104 984 146 984 195',
} as const satisfies Partial<Record<Zone, string>>;

/** The tunnel between the floor's halves: where a finding in the middle of the floor lies. */
export const TUNNEL_HALF =
  'M338 195 L338 172 C338 169 340 167 343 167 L703 167 C706 167 708 169 708 172 L708 195';
