import { lookAtPages } from './look-at-pages';

describe('The pages of everybody else', () => {
  lookAtPages({ of: 'pages', as: ['nobody', 'recorder', 'regional_lead', 'head_office'] });
});
