import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { IssuedReportPage } from './issued-report-page';
import { ReportsPage } from './reports-page';
import { SchedulePage } from './schedule-page';

export default [
  {
    path: '',
    providers: [FIELD_DEFAULTS],
    children: [
      { path: '', component: ReportsPage },
      { path: 'schedule', title: 'Schedule of the warranty-risk report', component: SchedulePage },
      { path: ':id', title: 'Issued warranty-risk report', component: IssuedReportPage },
    ],
  },
] satisfies Routes;
