import { recordAudit } from '#db/queries/audit';
import type { Scope } from '#db/scope';
import { exportAudit } from '#shared/contracts/audit';
import {
  exportBranches,
  exportClaims,
  exportComeBack,
  exportJobs,
  exportMargin,
  exportOverrun,
  exportProductBranches,
  exportProductNeed,
  exportProducts,
  exportProductTemperature,
  exportQuote,
  exportRot,
  exportRotModels,
  exportRotZones,
  exportWarrantyBranches,
  exportWarrantyClaimFree,
  exportWarrantyCohorts,
  exportWarrantyProcess,
  exportWarrantyRisk,
  exportWarrantyTriangle,
} from '#shared/contracts/exports';
import { MOST_CURVES } from '#shared/contracts/warranty';
import { breaksOfPeriod } from '#shared/domain/period';
import { refuseInput } from '#shared/domain/refusal';
import { actorOf } from '../../auth/caller';
import { realClock } from '../../clock';
import { claimListQuestion } from '../../http/claim-list-question';
import { comeBackQuestion } from '../../http/come-back-question';
import { streamCsv, type CsvChunks } from '../../http/csv-stream';
import { jobListQuestion } from '../../http/job-list-question';
import { mount, type Call, type Mounting, type Reply } from '../../http/mount';
import { quoteQuestion } from '../../http/quote-question';
import { scopeQuestion } from '../../http/scope-question';
import { breaksOfGroups, coverQuestion } from '../../http/warranty-question';
import type { Kit } from '../../kit';

/** Everything that leaves as a file; each export is in the audit trail before its first byte. */
export function mountExports(mounting: Mounting, kit: Kit): void {
  mount(mounting, exportJobs, (call) => {
    const { sort, ...query } = call.query;
    const { scope, ...asked } = jobListQuestion(kit, call.scope, query);
    return exported(kit, call, 'jobs', scope, () =>
      kit.reads.stream('jobs', scope, { ...asked, sort, money: 'seen' }),
    );
  });

  mount(mounting, exportClaims, (call) => {
    const { sort, ...query } = call.query;
    const { scope, asOf, filters } = claimListQuestion(kit, call.scope, query);
    // Of the jobs that the warranty answer is about: completed by its day (rules 15 and 62).
    const asked = { filters: { ...filters, to: filters.to ?? asOf }, asOf, sort };
    return exported(kit, call, 'claims', scope, () =>
      kit.reads.stream('claims', scope, { ...asked, money: 'seen' }),
    );
  });

  mount(mounting, exportMargin, (call) => {
    const { scope, ...question } = scopeQuestion(kit, call.scope, call.query);
    return exported(kit, call, 'margin', scope, () => kit.reads.stream('margin', scope, question));
  });

  mount(mounting, exportOverrun, (call) => {
    const { by, ...query } = call.query;
    const { scope, period, filters } = scopeQuestion(kit, call.scope, query);
    return exported(kit, call, 'overrun', scope, () =>
      kit.reads.stream('overrun', scope, { period, filters, by }),
    );
  });

  mount(mounting, exportBranches, (call) => {
    const { measure, ...query } = call.query;
    const { scope, ...asked } = scopeQuestion(kit, call.scope, query);
    return exported(kit, call, 'branches', scope, () =>
      kit.reads.stream('branches', scope, { ...asked, measure }),
    );
  });

  mount(mounting, exportComeBack, (call) => {
    const { scope, ...asked } = comeBackQuestion(kit, call.scope, call.query);
    return exported(kit, call, 'come-back', scope, () =>
      kit.reads.stream('come-back', scope, asked),
    );
  });

  for (const [contract, name] of [
    [exportRot, 'rot'],
    [exportRotModels, 'rot-models'],
    [exportRotZones, 'rot-zones'],
    [exportProducts, 'products'],
    [exportProductBranches, 'product-branches'],
    [exportProductTemperature, 'product-temperature'],
    [exportProductNeed, 'product-need'],
  ] as const) {
    mount(mounting, contract, (call) => {
      const { scope, ...question } = scopeQuestion(kit, call.scope, call.query);
      return exported(kit, call, name, scope, () => kit.reads.stream(name, scope, question));
    });
  }

  for (const [contract, name] of [
    [exportWarrantyClaimFree, 'warranty-claim-free'],
    [exportWarrantyCohorts, 'warranty-cohorts'],
    [exportWarrantyTriangle, 'warranty-triangle'],
    [exportWarrantyBranches, 'warranty-branches'],
    [exportWarrantyProcess, 'warranty-process'],
  ] as const) {
    mount(mounting, contract, (call) => {
      const { groupBy, group: groups, ...query } = call.query;
      const problems = breaksOfGroups(groups, MOST_CURVES);
      const { scope, ...asked } = coverQuestion(kit, call.scope, query, problems);
      return exported(kit, call, name, scope, () =>
        kit.reads.stream(name, scope, { ...asked, groupBy, groups }),
      );
    });
  }

  mount(mounting, exportWarrantyRisk, (call) => {
    // Region and branch choose rows; what they are a part of is the network's (rule 51).
    const { region: _region, branch: _branch, ...query } = call.query;
    const { scope, ...asked } = coverQuestion(kit, call.scope, query);
    const chosen = scope.narrow(call.query);
    const branches = chosen.branches.map(({ code }) => code);
    return exported(kit, call, 'warranty-risk', chosen, () =>
      kit.reads.stream('warranty-risk', scope, { ...asked, branches }),
    );
  });

  mount(mounting, exportAudit, (call) => {
    const { from, to } = call.query;
    const problems = from !== undefined && to !== undefined ? breaksOfPeriod({ from, to }) : [];
    if (problems.length > 0) throw refuseInput(problems);
    return exported(kit, call, 'audit', call.scope, () =>
      kit.reads.stream('audit', call.scope, call.query),
    );
  });

  mount(mounting, exportQuote, (call) => {
    const { scope, ...question } = quoteQuestion(kit, call.scope, call.query, 'seen');
    return exported(kit, call, 'quote', scope, () => kit.reads.stream('quote', scope, question));
  });
}

async function exported(
  kit: Kit,
  call: Pick<Call, 'caller' | 'address'> & { query: object },
  name: string,
  scope: Scope,
  begin: () => CsvChunks,
): Promise<Reply<string>> {
  await kit.store.queue.write(() =>
    recordAudit(kit.store.unscoped, {
      at: realClock.now().toISOString(),
      actor: actorOf(call.caller, call.address),
      action: `export.${name}`,
      subject: `/exports/${name}.csv`,
      branchId: null,
      detail: { query: call.query, branches: scope.echo().branches },
    }),
  );
  return { stream: (response) => streamCsv(response, `underseam-${name}.csv`, begin()) };
}
