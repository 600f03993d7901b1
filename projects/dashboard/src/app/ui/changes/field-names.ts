/** A field's name from its own: `targetShare` → `target share`, `totalCents` → `total`. */
export function plainName(name: string): string {
  if (Object.hasOwn(FIELD_NAMES, name)) return FIELD_NAMES[name] ?? name;
  return name
    .replace(/(Cents|Minutes)$/, '')
    .replace(/([a-z0-9])([A-Z])/g, '$1 $2')
    .replaceAll('_', ' ')
    .toLocaleLowerCase();
}

/** Names of recorded fields as the sheets and forms say them; a field that is not here is read from its own name. */
const FIELD_NAMES: Readonly<Record<string, string>> = {
  key: "branch's key of the car",
  bodyType: 'body type',
  firstRegistered: 'first registered',
  odometerKm: 'odometer',
  bookedOn: 'booked',
  startedOn: 'begun',
  completedOn: 'finished',
  priceCents: 'price',
  boughtInCents: 'bought-in',
  ml: 'used',
  quantity: 'number used',
  unitCostCents: 'cost of one',
  seenAs: 'seen as',
  workedAs: 'worked as',
  structural: 'load-bearing',
  action: 'what was done',
  repairMinutes: 'repair',
  chargedCents: 'charged for it',
  temperatureC: 'temperature',
  humidityPct: 'humidity',
  so2Deposition: 'sulphur dioxide',
  chlorideDeposition: 'chloride',
  ownerToldOn: 'owner told',
  dueOn: 'due',
  decidedOn: 'decided',
  proposedDecision: 'proposed to head office',
  madeOn: 'made',
  paidOn: 'paid',
  costCents: 'cost',
  productMl: 'product',
  labourMinutes: 'labour',
  jobRef: 'job',
  timeZone: 'time zone',
  openedOn: 'opened',
  closedOn: 'closed',
  targetMarginShare: 'target margin',
  claimLimitCents: 'limit of claims a branch decides',
  feeRate: 'network fee',
  warrantyMonths: 'warranty',
  hourlyCostCents: 'hourly cost',
  costPerLitreCents: 'cost of a litre',
  on: 'agreed on',
  from: 'from',
  email: 'e-mail',
  active: 'may sign in',
  ended: 'sign-ins ended',
  signInsEnded: 'sign-ins ended',
  otherSignInsEnded: 'other sign-ins ended',
  until: 'locked until',
};
