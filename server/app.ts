import compression from 'compression';
import express, { Router, type Express } from 'express';
import helmet from 'helmet';
import { join } from 'node:path';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import type { Endpoint } from '#shared/contracts/endpoint';
import { attemptLimits } from './auth/attempt-limits';
import { makeAuthenticate } from './auth/authenticate';
import { mountAudit } from './features/audit/audit.endpoints';
import { mountBookings } from './features/bookings/bookings.endpoints';
import { mountClaimList } from './features/claims/claim-list.endpoints';
import { mountClaims } from './features/claims/claims.endpoints';
import { mountComeBack } from './features/come-back/come-back.endpoints';
import { mountCorrections } from './features/corrections/corrections.endpoints';
import { mountExports } from './features/exports/exports.endpoints';
import { mountImports } from './features/imports/imports.endpoints';
import { mountJobList } from './features/job-list/job-list.endpoints';
import { mountJobs } from './features/jobs/jobs.endpoints';
import { mountMailbox } from './features/mailbox/mailbox.endpoints';
import { mountMargin } from './features/margin/margin.endpoints';
import { mountOverrun } from './features/overrun/overrun.endpoints';
import { mountPeople } from './features/people/people.endpoints';
import { mountClaimPhotos } from './features/photos/claim-photos.endpoints';
import { mountPhotos } from './features/photos/photos.endpoints';
import { mountProducts } from './features/products/products.endpoints';
import { mountPushKeys } from './features/push-keys/push-keys.endpoints';
import { mountQuote } from './features/quote/quote.endpoints';
import { mountRot } from './features/rot/rot.endpoints';
import { mountSetUpHelp } from './features/set-up-help/set-up-help.endpoints';
import { mountSetUp } from './features/set-up/set-up.endpoints';
import { mountSignIn } from './features/sign-in/sign-in.endpoints';
import { mountSystem } from './features/system/system.endpoints';
import { mountUnderWay } from './features/under-way/under-way.endpoints';
import { mountUsual } from './features/quote/usual.endpoints';
import { mountWarranty } from './features/warranty/warranty.endpoints';
import { mountWarrantyReports } from './features/warranty-reports/warranty-reports.endpoints';
import { mountActions } from './features/actions/actions.endpoints';
import { mountBranches } from './features/branches/branches.endpoints';
import { mountLive } from './features/live/live.endpoints';
import { mountSignals } from './features/signals/signals.endpoints';
import { mountTargets } from './features/targets/targets.endpoints';
import { mountUnsubscribe } from './features/digests/unsubscribe.endpoints';
import { mountWeeks } from './features/weeks/weeks.endpoints';
import { mountDashboard } from './http/dashboard';
import { mountDocs } from './http/docs';
import { handleErrors, nothingHere } from './http/error-handler';
import type { Mounting } from './http/mount';
import { describeApi } from './http/openapi';
import type { Kit } from './kit';

export interface App {
  express: Express;
  /** Every contract that is mounted, for the tests that walk them. */
  mounted: readonly Endpoint[];
}

/** Puts the product together: every route through `mount`, the description of the API, the dashboard, one error handler. */
export function createApp(kit: Kit, log: Logger, dashboard: string): App {
  const app = express();
  app.disable('x-powered-by');
  // A job's entity tag is its revision; nothing else is cached.
  app.set('etag', false);
  app.set('query parser', 'simple');
  app.set('trust proxy', 'loopback');
  app.use(helmet({ contentSecurityPolicy: false }));
  app.use(compression({ filter: isText }));
  // Only where somebody reads it, because it costs every request.
  if (log.isLevelEnabled('debug')) {
    app.use(
      pinoHttp({
        logger: log,
        useLevel: 'debug',
        // No header goes into a log: tokens, cookies and keys travel in them.
        serializers: {
          req: ({ id, method, url }: { id: unknown; method: string; url: string }) => ({
            id,
            method,
            url,
          }),
          res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
        },
      }),
    );
  }

  app.use(attemptLimits());
  const router = Router();
  const mounting: Mounting = {
    router,
    authenticate: makeAuthenticate(kit),
    branches: () => kit.store.state.branches,
    hasPackage: (code) => kit.store.state.package(code) !== undefined,
    incoming: join(kit.config.data, 'incoming'),
    mounted: [],
  };
  mountSystem(mounting, kit);
  mountSignIn(mounting, kit);
  mountPeople(mounting, kit);
  mountPushKeys(mounting, kit);
  mountSetUp(mounting, kit);
  mountSetUpHelp(mounting, kit);
  mountJobs(mounting, kit);
  mountCorrections(mounting, kit);
  mountUnderWay(mounting, kit);
  mountPhotos(mounting, kit);
  mountClaimPhotos(mounting, kit);
  mountImports(mounting, kit);
  mountJobList(mounting, kit);
  mountClaims(mounting, kit);
  mountClaimList(mounting, kit);
  mountBookings(mounting, kit);
  mountMargin(mounting, kit);
  mountOverrun(mounting, kit);
  mountRot(mounting, kit);
  mountProducts(mounting, kit);
  mountWarranty(mounting, kit);
  mountWarrantyReports(mounting, kit);
  mountBranches(mounting, kit);
  mountSignals(mounting, kit);
  mountActions(mounting, kit);
  mountTargets(mounting, kit);
  mountComeBack(mounting, kit);
  mountQuote(mounting, kit);
  mountUsual(mounting, kit);
  mountWeeks(mounting, kit);
  mountExports(mounting, kit);
  mountAudit(mounting, kit);
  mountLive(mounting, kit);
  mountUnsubscribe(mounting, kit);
  mountMailbox(mounting, kit);
  mountDocs(router, () => describeApi(mounting.mounted, kit.version));

  app.use(router);
  app.use('/api', nothingHere);
  mountDashboard(app, dashboard);
  app.use(handleErrors(log));
  return { express: app, mounted: mounting.mounted };
}

/** Exports and live changes leave at their own pace; compressing them would buffer. */
function isText(request: express.Request, response: express.Response): boolean {
  if (request.path.startsWith('/api/exports/') || request.path === '/api/live') return false;
  return compression.filter(request, response);
}
