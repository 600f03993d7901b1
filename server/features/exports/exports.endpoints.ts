import { recordAudit } from '#db/queries/audit';
import type { Scope } from '#db/scope';
import { exportJobs, exportMargin, exportOverrun } from '#shared/contracts/exports';
import { actorOf, moneyFor } from '../../auth/caller';
import { realClock } from '../../clock';
import { jobListQuestion } from '../../http/job-list-question';
import { mount, type Call, type Mounting, type Reply } from '../../http/mount';
import { scopeQuestion } from '../../http/scope-question';
import type { Kit } from '../../kit';
import type { ExportName, ExportTasks } from '../../workers/read-tasks';

/** Everything that leaves as a file; each export is in the audit trail before its first byte. */
export function mountExports(mounting: Mounting, kit: Kit): void {
  mount(mounting, exportJobs, (call) => {
    const { sort, ...query } = call.query;
    const { scope, ...asked } = jobListQuestion(kit, call.scope, query);
    const money = moneyFor(call.caller);
    return exported(kit, call, 'jobs', scope, { ...asked, sort, money });
  });

  mount(mounting, exportMargin, (call) => {
    const { scope, ...question } = scopeQuestion(kit, call.scope, call.query);
    return exported(kit, call, 'margin', scope, { ...question, targetMarginShare: null });
  });

  mount(mounting, exportOverrun, (call) => {
    const { by, ...query } = call.query;
    const { scope, period, filters } = scopeQuestion(kit, call.scope, query);
    return exported(kit, call, 'overrun', scope, { period, filters, by });
  });
}

async function exported<Name extends ExportName>(
  kit: Kit,
  call: Call,
  name: Name,
  scope: Scope,
  question: ExportTasks[Name],
): Promise<Reply<string>> {
  await kit.store.queue.write(() =>
    recordAudit(kit.store.unscoped, {
      at: realClock.now().toISOString(),
      actor: actorOf(call.caller, call.address),
      action: `export.${name}`,
      subject: `/exports/${name}.csv`,
      branchId: null,
      detail: { query: call.query as Record<string, unknown>, branches: scope.echo().branches },
    }),
  );
  return {
    headers: {
      'Content-Type': 'text/csv; charset=utf-8; header=present',
      'Content-Disposition': `attachment; filename="underseam-${name}.csv"`,
    },
    stream: (response) => kit.reads.stream(name, scope, question, response),
  };
}
