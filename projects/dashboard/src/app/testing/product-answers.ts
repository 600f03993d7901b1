import type {
  ProductBranch,
  ProductNeed,
  ProductNeedAnswer,
  ProductsAnswer,
  ProductTemperature,
  ProductUse,
} from '#shared/contracts/products';

/** Cavity wax in 100 full hatchbacks: norm 4 L, median 3.8 L, 3 cars under and 2 over, unless said. */
export function productUse(more: Partial<ProductUse> = {}): ProductUse {
  return {
    product: 'CW1',
    package: 'full',
    bodyType: 'hatchback',
    cars: 100,
    carsListing: 100,
    meanMl: 3820,
    p10Ml: 3200,
    p25Ml: 3500,
    medianMl: 3800,
    p75Ml: 4100,
    p90Ml: 4600,
    normMl: 4000,
    costPerCarCents: 4202,
    under: 3,
    over: 2,
    underShare: 0.03,
    overShare: 0.02,
    ...more,
  };
}

/** Rust converter, which has no norm, in 40 full hatchbacks, unless said. */
export function normlessUse(more: Partial<ProductUse> = {}): ProductUse {
  return productUse({
    product: 'RC1',
    cars: 40,
    carsListing: 40,
    meanMl: 160,
    p10Ml: 70,
    p25Ml: 100,
    medianMl: 150,
    p75Ml: 210,
    p90Ml: 290,
    normMl: null,
    costPerCarCents: 480,
    under: null,
    over: null,
    underShare: null,
    overShare: null,
    ...more,
  });
}

/** Three cars: counts, and nothing else. */
export function fewUse(more: Partial<ProductUse> = {}): ProductUse {
  return productUse({
    cars: 3,
    carsListing: 3,
    meanMl: null,
    p10Ml: null,
    p25Ml: null,
    medianMl: null,
    p75Ml: null,
    p90Ml: null,
    costPerCarCents: null,
    under: 1,
    over: 0,
    underShare: null,
    overShare: null,
    ...more,
  });
}

/** A branch at 94 % of the norm, 92–96 %, from 412 cars, unless said. */
export function productBranch(branch: string, more: Partial<ProductBranch> = {}): ProductBranch {
  return { branch, cars: 412, ratioToNorm: 0.94, lower: 0.92, upper: 0.96, ...more };
}

/** Cavity wax that runs thinner when warm: 41 ml less a degree, 35–47, from 380 cars, unless said. */
export function productTemperature(more: Partial<ProductTemperature> = {}): ProductTemperature {
  return {
    product: 'CW1',
    cars: 380,
    slopeMlPerDegree: -41,
    lower: -47,
    upper: -35,
    classes: [
      { fromC: 5, cars: 3, p25Ml: null, medianMl: null, p75Ml: null },
      { fromC: 10, cars: 140, p25Ml: 3700, medianMl: 4050, p75Ml: 4400 },
      { fromC: 15, cars: 190, p25Ml: 3500, medianMl: 3850, p75Ml: 4150 },
      { fromC: 20, cars: 47, p25Ml: 3300, medianMl: 3600, p75Ml: 3900 },
    ],
    ...more,
  };
}

/** An answer of one branch: 412 cars at 94 % of the norm, unless said. */
export function productsAnswer(more: Partial<ProductsAnswer> = {}): ProductsAnswer {
  return {
    period: { from: '2025-08-04', to: '2026-02-01' },
    scope: { regions: ['OC'], branches: ['HAV'] },
    jobs: 420,
    withoutCost: 0,
    missingCosts: [],
    overall: {
      cars: 412,
      costedCars: 412,
      ratioToNorm: 0.94,
      lower: 0.92,
      upper: 0.96,
      costPerCarCents: 6340,
    },
    use: [
      productUse({ cars: 120, carsListing: 120, under: 22, underShare: 22 / 120 }),
      productUse({ bodyType: 'estate' }),
      productUse({
        package: 'cavity',
        bodyType: 'suv',
        cars: 60,
        carsListing: 60,
        under: 0,
        underShare: 0,
      }),
      fewUse({ bodyType: 'camper' }),
      fewUse({ bodyType: 'classic', cars: 2, under: 0 }),
      normlessUse(),
    ],
    branches: [productBranch('HAV')],
    temperature: [productTemperature()],
    ...more,
  };
}

/** No job at all. */
export function noProducts(more: Partial<ProductsAnswer> = {}): ProductsAnswer {
  return productsAnswer({
    jobs: 0,
    overall: {
      cars: 0,
      costedCars: 0,
      ratioToNorm: null,
      lower: null,
      upper: null,
      costPerCarCents: null,
    },
    use: [],
    branches: [],
    temperature: [],
    ...more,
  });
}

/** 84 cars' worth of cavity wax: 340 L, 300–380 L, €3,740, unless said. */
export function productNeed(more: Partial<ProductNeed> = {}): ProductNeed {
  return {
    product: 'CW1',
    ml: 340_400,
    lowerMl: 300_200,
    upperMl: 380_900,
    costCents: 374_000,
    ...more,
  };
}

/** Eight weeks of one branch: 23 cars in the diary, about 61 more as usual, unless said. */
export function productNeedAnswer(more: Partial<ProductNeedAnswer> = {}): ProductNeedAnswer {
  const booked = [9, 6, 4, 2, 1, 1, 0, 0];
  const usual = [1.4, 4.4, 6.4, 8.4, 9.8, 9.8, 10.4, 10.4];
  return {
    period: { from: '2025-08-04', to: '2026-02-01' },
    scope: { regions: ['OC'], branches: ['HAV'] },
    jobs: 270,
    coming: { from: '2026-02-09', to: '2026-04-05' },
    weeks: booked.map((cars, index) => ({
      week: `2026-W${String(index + 7).padStart(2, '0')}`,
      booked: cars,
      usual: usual[index]!,
    })),
    needs: [
      productNeed(),
      productNeed({ product: 'RC1', ml: 6240, lowerMl: 4100, upperMl: 8300, costCents: null }),
    ],
    carsWithoutUse: 0,
    missingCosts: [],
    ...more,
  };
}
