import { HttpContextToken } from '@angular/common/http';

/** Whether a request carries the access token: true for every call whose contract is not public. */
export const NEEDS_TOKEN = new HttpContextToken<boolean>(() => false);
