import { lookAtPages } from './look-at-pages';

describe('What opens on the pages of everybody else', () => {
  lookAtPages({ of: 'states', as: ['nobody', 'recorder', 'regional_lead', 'head_office'] });
});
