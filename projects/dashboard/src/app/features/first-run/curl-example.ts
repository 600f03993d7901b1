/** What a first push names. */
export interface CurlSource {
  /** Where the product is served: `https://underseam.example`. */
  readonly origin: string;
  readonly branch: string;
  readonly sold: string;
  readonly product: string | undefined;
  /** The day on which the car was finished. */
  readonly day: string;
}

/** A command that sends a first finished car with a push key, to be copied into a terminal. */
export function curlExample({ origin, branch, sold, product, day }: CurlSource): string {
  const job = {
    vehicle: {
      make: 'Make',
      model: 'Model',
      bodyType: 'hatchback',
      firstRegistered: '2014-05',
    },
    package: sold,
    completedOn: day,
    estimate: { priceCents: 78_000, stages: { strip: 90, clean: 75, apply: 120, refit: 60 } },
    actual: { stages: { strip: 100, clean: 90, apply: 130, refit: 65 } },
    ...(product === undefined ? {} : { products: [{ product, ml: 4000 }] }),
    invoice: { number: '1', totalCents: 78_000 },
  };
  return [
    `curl -X PUT "${origin}/api/branches/${branch}/jobs/first-1" \\`,
    '  -H "Authorization: Bearer $KEY" \\',
    '  -H "Content-Type: application/json" \\',
    `  -d '${JSON.stringify(job, undefined, 2)}'`,
  ].join('\n');
}
