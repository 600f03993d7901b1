import type { Endpoint } from './endpoint';
import * as actions from './actions';
import * as audit from './audit';
import * as auth from './auth';
import * as bookings from './bookings';
import * as branches from './branches';
import * as claimList from './claim-list';
import * as claims from './claims';
import * as comeBack from './come-back';
import * as corrections from './corrections';
import * as csvExports from './exports';
import * as imports from './imports';
import * as jobList from './job-list';
import * as jobs from './jobs';
import * as live from './live';
import * as margin from './margin';
import * as overrun from './overrun';
import * as people from './people';
import * as photos from './photos';
import * as products from './products';
import * as pushKeys from './push-keys';
import * as quote from './quote';
import * as rot from './rot';
import * as setUp from './set-up';
import * as setUpHelp from './set-up-help';
import * as signals from './signals';
import * as system from './system';
import * as targets from './targets';
import * as underWay from './under-way';
import * as unsubscribe from './unsubscribe';
import * as usual from './usual';
import * as warranty from './warranty';
import * as warrantyReports from './warranty-reports';
import * as weeks from './weeks';

/** Every call of the API: what is mounted, documented and walked by the tests. */
export const endpoints: readonly Endpoint[] = [
  auth,
  people,
  setUp,
  setUpHelp,
  pushKeys,
  jobs,
  corrections,
  underWay,
  photos,
  imports,
  jobList,
  claims,
  claimList,
  bookings,
  margin,
  overrun,
  rot,
  products,
  warranty,
  warrantyReports,
  branches,
  signals,
  actions,
  targets,
  comeBack,
  quote,
  usual,
  weeks,
  csvExports,
  audit,
  live,
  unsubscribe,
  system,
].flatMap((topic) => Object.values(topic).filter(isEndpoint));

function isEndpoint(value: unknown): value is Endpoint {
  return typeof value === 'object' && value !== null && 'method' in value && 'access' in value;
}
