import { claimContent } from '#shared/contracts/claims';
import { bookingContent } from '#shared/contracts/bookings';
import { reference } from '#shared/contracts/fields';
import { jobContent } from '#shared/contracts/jobs';
import * as setUpContracts from '#shared/contracts/set-up';
import { breaksOfClaim } from '#shared/domain/claim-rules';
import { breaksOfJob } from '#shared/domain/job-rules';
import { addDays, dayNumber } from '#shared/domain/calendar';
import { historyOf } from './branch-history';
import { BRANCHES } from './branches';
import { newestContent, type BranchHistory, type DemoNetwork } from './demo-network';
import { DEMO_SEED, generateNetwork } from './generate-network';
import { weekdayOf } from './working-calendar';

const TODAY = '2026-02-02';
const YESTERDAY = '2026-02-01';

describe('generateNetwork', () => {
  let network: DemoNetwork;
  let histories: BranchHistory[];

  beforeAll(() => {
    network = generateNetwork({ seed: DEMO_SEED, today: TODAY });
    histories = [...network.histories()];
  });

  test('asked twice with one seed and day, gives the same set-up and histories byte for byte', () => {
    const again = generateNetwork({ seed: DEMO_SEED, today: TODAY });
    expect(JSON.stringify(again.setUp)).toBe(JSON.stringify(network.setUp));
    const [first] = again.histories();
    expect(JSON.stringify(first)).toBe(JSON.stringify(histories[0]));
  });

  test('asked with another seed, gives other jobs', () => {
    const other = historyOf(BRANCHES[0]!, DEMO_SEED + 1, TODAY);
    expect(JSON.stringify(other.jobs)).not.toBe(JSON.stringify(histories[0]!.jobs));
  });

  test('seen from any day, has 24 branches in 4 regions and about 50,000 jobs', () => {
    expect(new Set(network.setUp.branches.map((branch) => branch.code)).size).toBe(24);
    expect(new Set(network.setUp.branches.map((branch) => branch.region)).size).toBe(4);
    expect(histories.map((history) => history.branchCode)).toEqual(
      network.setUp.branches.map((branch) => branch.code),
    );
    const jobs = histories.reduce((all, history) => all + history.jobs.length, 0);
    expect(jobs).toBeGreaterThan(47_000);
    expect(jobs).toBeLessThan(55_000);
  });

  test('at Havnsund, has a Velder Tessock as the documents show it', () => {
    const havnsund = histories.find((history) => history.branchCode === 'HAV')!;
    const seen = havnsund.jobs.filter((job) => job.content.vehicle.model === 'Tessock');
    expect(seen.length).toBeGreaterThan(50);
    expect(seen.every((job) => job.content.vehicle.make === 'Velder')).toBe(true);
  });

  test('its set-up, sent through the contracts, is taken as it is', () => {
    const { setUp } = network;
    const { putNetwork, putFee, putRegion, putBranch, putRate } = setUpContracts;
    expect(putNetwork.body.parse(setUp.network)).toEqual(setUp.network);
    for (const { from, ...fee } of setUp.fees) {
      expect(putFee.params.parse({ from })).toEqual({ from });
      expect(putFee.body.parse(fee)).toEqual(fee);
    }
    for (const { code, ...region } of setUp.regions) {
      expect(putRegion.params.parse({ code })).toEqual({ code });
      expect(putRegion.body.parse(region)).toEqual(region);
    }
    for (const { code, ...branch } of setUp.branches) {
      expect(putBranch.params.parse({ code })).toEqual({ code });
      expect(putBranch.body.parse(branch)).toEqual(branch);
    }
    for (const { branch, from, ...rate } of setUp.rates) {
      expect(putRate.params.parse({ code: branch, from })).toEqual({ code: branch, from });
      expect(putRate.body.parse(rate)).toEqual(rate);
    }
  });

  test('its catalogue, sent through the contracts, is taken as it is', () => {
    const { setUp } = network;
    const { putProduct, putProductCost, putConsumableCost, putPackage, putNorms } = setUpContracts;
    for (const { code, ...product } of setUp.products) {
      expect(putProduct.params.parse({ code })).toEqual({ code });
      expect(putProduct.body.parse(product)).toEqual(product);
    }
    for (const { product, from, ...cost } of setUp.productCosts) {
      expect(putProductCost.params.parse({ code: product, from }).from).toBe(from);
      expect(putProductCost.body.parse(cost)).toEqual(cost);
    }
    for (const { kind, from, ...cost } of setUp.consumableCosts) {
      expect(putConsumableCost.params.parse({ kind, from }).from).toBe(from);
      expect(putConsumableCost.body.parse(cost)).toEqual(cost);
    }
    for (const { code, ...entry } of setUp.packages) {
      expect(putPackage.params.parse({ code })).toEqual({ code });
      expect(putPackage.body.parse(entry)).toEqual(entry);
    }
    for (const { package: code, bodyType, norms } of setUp.norms) {
      expect(putNorms.params.parse({ code, bodyType })).toEqual({ code, bodyType });
      expect(putNorms.body.parse({ norms })).toEqual({ norms });
    }
  });

  test('its dated costs, over the five years, each change at least once and are known before the first job', () => {
    const { fees, rates, productCosts, consumableCosts } = network.setUp;
    expect(fees.some((fee) => fee.from > '2021-02-02' && fee.from < TODAY)).toBe(true);
    const starts = new Map<string, string[]>();
    const note = (key: string, from: string) => starts.set(key, [...(starts.get(key) ?? []), from]);
    rates.forEach((rate) => note(`branch ${rate.branch}`, rate.from));
    productCosts.forEach((cost) => note(`product ${cost.product}`, cost.from));
    consumableCosts.forEach((cost) => note(`consumable ${cost.kind}`, cost.from));
    expect(starts.size).toBe(24 + 6 + 5);
    for (const dates of starts.values()) {
      expect(dates.length).toBeGreaterThan(1);
      expect(dates[0]! < '2021-02-02').toBe(true);
    }
  });

  test('every seventh job, through the contract and the rules across fields, is refused nothing', () => {
    const world = {
      today: YESTERDAY,
      isProduct: (code: string) => network.setUp.products.some((product) => product.code === code),
      isPackage: (code: string) => network.setUp.packages.some((entry) => entry.code === code),
    };
    const refused: { jobRef: string; problems: unknown[] }[] = [];
    let checked = 0;
    for (const history of histories) {
      for (let index = checked % 7; index < history.jobs.length; index += 7) {
        const job = history.jobs[index]!;
        for (const { content } of [job, ...(job.corrections ?? [])]) {
          const read = jobContent.safeParse(content);
          const problems = [...(read.error?.issues ?? []), ...breaksOfJob(content, world)];
          if (problems.length > 0 || !reference.safeParse(job.jobRef).success) {
            refused.push({ jobRef: job.jobRef, problems });
          }
          checked += 1;
        }
      }
    }
    expect(refused).toEqual([]);
    expect(checked).toBeGreaterThan(7000);
  });

  test('every job, in its branch, is finished on a working day between opening and yesterday, once under its reference', () => {
    const opened = new Map(network.setUp.branches.map((branch) => [branch.code, branch.openedOn]));
    for (const { branchCode, jobs } of histories) {
      const saturdays = BRANCHES.find((branch) => branch.code === branchCode)?.saturdays === true;
      expect(new Set(jobs.map((job) => job.jobRef)).size).toBe(jobs.length);
      const wrong = jobs.filter(({ content }) => {
        const weekday = weekdayOf(dayNumber(content.completedOn));
        return (
          content.completedOn > YESTERDAY ||
          content.completedOn < '2021-02-02' ||
          content.completedOn < opened.get(branchCode)! ||
          weekday > (saturdays ? 5 : 4)
        );
      });
      expect(wrong).toEqual([]);
    }
  });

  test('every arrival, in its branch, comes in time order and never before what it reports', () => {
    const wrong: string[] = [];
    for (const { jobs } of histories) {
      const first = jobs.map((job) => job.receivedAt);
      expect(first).toEqual([...first].sort());
      for (const job of jobs) {
        const versions = [job, ...(job.corrections ?? [])];
        const times = versions.map((version) => version.receivedAt);
        if (job.voided) times.push(job.voided.at);
        const rising = times.every((time, index) => index === 0 || times[index - 1]! < time);
        const known = versions.every(
          ({ content, receivedAt }) =>
            receivedAt.slice(0, 10) >= (content.invoice?.issuedOn ?? content.completedOn),
        );
        if (!rising || !known || times.at(-1)! >= TODAY) wrong.push(job.jobRef);
      }
    }
    expect(wrong).toEqual([]);
  });

  test('every claim, beside its job, passes the contract and keeps the order of its dates', () => {
    for (const { jobs, claims } of histories) {
      const byRef = new Map(jobs.map((job) => [job.jobRef, job]));
      for (const { content, receivedAt } of claims) {
        expect(claimContent.safeParse(content).error?.issues ?? []).toEqual([]);
        expect(breaksOfClaim(content, YESTERDAY)).toEqual([]);
        const job = byRef.get(content.jobRef)!;
        expect(job.voided).toBeUndefined();
        const decidedOn = content.decidedOn ?? content.madeOn;
        const dates = [newestContent(job).completedOn, content.madeOn, decidedOn];
        if (content.paidOn) dates.push(content.paidOn);
        expect(dates).toEqual([...dates].sort());
        expect(dates.at(-1)! <= YESTERDAY && receivedAt < TODAY).toBe(true);
        expect(content.decision === 'open').toBe(content.decidedOn === undefined);
        if (content.decision === 'open') expect(content.paidOn).toBeUndefined();
      }
    }
  });

  test('every booking, seen from today, passes the contract and lies ahead', () => {
    const bookings = histories.flatMap((history) => history.bookings);
    expect(bookings.length).toBeGreaterThan(400);
    for (const { content } of bookings) {
      expect(bookingContent.safeParse(content).error?.issues ?? []).toEqual([]);
      expect(content.expectedOn >= TODAY && content.expectedOn < addDays(TODAY, 43)).toBe(true);
    }
  });

  test('the ordinary mishaps of the trade, counted over the network, all happen', () => {
    const jobs = histories.flatMap((history) => history.jobs).filter((job) => !job.voided);
    const contents = jobs.map(newestContent);
    const findings = contents.flatMap((content) => content.findings ?? []);
    const share = (part: number, whole: number) => part / whole;
    const without = contents.filter((content) => !content.estimate).length;
    expect(share(without, jobs.length)).toBeGreaterThan(0.005);
    expect(share(without, jobs.length)).toBeLessThan(0.03);
    const unbilled = contents.filter((content) => !content.invoice);
    const recent = unbilled.filter((content) => content.completedOn > addDays(TODAY, -22));
    const forgotten = unbilled.filter((content) => content.completedOn < addDays(TODAY, -120));
    expect(recent.length / 24).toBeGreaterThan(2);
    expect(recent.length / 24).toBeLessThan(8);
    expect(forgotten.length).toBeGreaterThan(10);
    expect(forgotten.length / 24).toBeLessThan(4);
    expect(findings.filter((finding) => finding.action === 'declined').length).toBeGreaterThan(500);
    const dangerous = findings.filter(
      (finding) => finding.action === 'deferred' && finding.structural,
    );
    expect(dangerous.length).toBeGreaterThan(500);
    const opened = findings.filter(
      (finding) => finding.seenAs === 'bubbling' && finding.workedAs === 'holed',
    );
    expect(opened.length).toBeGreaterThan(3000);
    const extras = contents.filter((content) => content.agreedExtras && content.invoice);
    const unpaid = extras.filter(
      ({ estimate, invoice, agreedExtras }) =>
        (agreedExtras ?? []).length > 0 && estimate && invoice!.totalCents! <= estimate.priceCents,
    );
    expect(share(unpaid.length, extras.length)).toBeGreaterThan(0.1);
    expect(share(unpaid.length, extras.length)).toBeLessThan(0.35);
    const all = histories.flatMap((history) => history.jobs);
    expect(all.filter((job) => job.voided).length).toBeGreaterThan(80);
    expect(all.filter((job) => job.corrections).length).toBeGreaterThan(2000);
  });

  test('cars that come back, under their own key, have put-off rot worked in the same zone and side', () => {
    let closed = 0;
    for (const { jobs } of histories) {
      const open = new Map<string, Set<string>>();
      for (const content of jobs.map(newestContent).sort(byCompletion)) {
        const key = content.vehicle.key!;
        for (const finding of content.findings ?? []) {
          const spot = `${finding.zone} ${finding.side}`;
          const worked = finding.action === 'patched' || finding.action === 'treated';
          if (worked && open.get(key)?.has(spot)) closed += 1;
          if (finding.action === 'deferred') {
            open.set(key, (open.get(key) ?? new Set()).add(spot));
          }
        }
      }
    }
    expect(closed).toBeGreaterThan(300);
  });
});

function byCompletion(a: { completedOn: string }, b: { completedOn: string }): number {
  return a.completedOn < b.completedOn ? -1 : 1;
}
