import { BODY_TYPES, type BodyType } from '#shared/domain/vocabulary';
import type { DemoSetUp, PackageCode, ProductCode } from './demo-network';

/** What the demo sells and sprays. Magnitudes are common practice, no source; all names are invented. */

export const PRODUCTS: DemoSetUp['products'] = [
  { code: 'CW1', name: 'Cavity wax, thin', kind: 'cavity_wax' },
  { code: 'UW1', name: 'Underbody wax, bodied', kind: 'underbody_wax' },
  { code: 'SC1', name: 'Stone-chip coat', kind: 'stone_chip' },
  { code: 'RC1', name: 'Rust converter', kind: 'rust_converter' },
  { code: 'ZP1', name: 'Zinc primer', kind: 'zinc_primer' },
  { code: 'SS1', name: 'Seam sealer', kind: 'seam_sealer' },
];

export const PACKAGES: DemoSetUp['packages'] = [
  { code: 'full', name: 'Full', warrantyMonths: 36 },
  { code: 'cavity', name: 'Cavity', warrantyMonths: 36 },
  { code: 'underbody', name: 'Underbody', warrantyMonths: 24 },
  { code: 'top_up', name: 'Top-up', warrantyMonths: 12 },
];

/** How a body type compares with a hatchback. */
export interface BodySize {
  product: number;
  time: number;
  price: number;
}

export const BODY_SIZES: Record<BodyType, BodySize> = {
  hatchback: { product: 1, time: 1, price: 1 },
  saloon: { product: 1.06, time: 1.03, price: 1.03 },
  estate: { product: 1.12, time: 1.06, price: 1.06 },
  suv: { product: 1.22, time: 1.1, price: 1.12 },
  pickup: { product: 1.48, time: 1.18, price: 1.23 },
  van: { product: 1.52, time: 1.22, price: 1.26 },
  camper: { product: 1.58, time: 1.28, price: 1.3 },
  classic: { product: 1.05, time: 1.26, price: 1.24 },
};

/** Millilitres that a package needs on a hatchback. */
const HATCHBACK_ML: Record<PackageCode, Partial<Record<ProductCode, number>>> = {
  full: { CW1: 4000, UW1: 4000, SC1: 1500 },
  cavity: { CW1: 4200 },
  underbody: { UW1: 4300, SC1: 1600 },
  top_up: { CW1: 900, UW1: 1100 },
};

/** Expected product by package and body type, rounded to 50 ml. Converter, primer and sealer have no norm: they follow rot. */
export const NORMS: DemoSetUp['norms'] = PACKAGES.flatMap(({ code }) =>
  BODY_TYPES.map((bodyType) => ({
    package: code,
    bodyType,
    norms: Object.entries(HATCHBACK_ML[code]).map(([product, ml]) => ({
      product: product as ProductCode,
      ml: Math.round((ml * BODY_SIZES[bodyType].product) / 50) * 50,
    })),
  })),
);

const NORM_LINES = new Map(
  NORMS.map((norm) => [`${norm.package} ${norm.bodyType}`, norm.norms] as const),
);

/** The norm lines of a package on a body type. */
export function normOf(
  packageCode: PackageCode,
  bodyType: BodyType,
): readonly { product: ProductCode; ml: number }[] {
  return NORM_LINES.get(`${packageCode} ${bodyType}`) ?? [];
}

/** How often each package is sold. */
export const PACKAGE_MIX: readonly (readonly [PackageCode, number])[] = [
  ['full', 0.6],
  ['underbody', 0.16],
  ['cavity', 0.12],
  ['top_up', 0.12],
];

/** Quoted price of each package on a hatchback at the Inner Sounds today, cents. */
export const BASE_PRICE_CENTS: Record<PackageCode, number> = {
  full: 77000,
  underbody: 60500,
  cavity: 48500,
  top_up: 26500,
};
