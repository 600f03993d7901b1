import { lookAtPages } from './look-at-pages';

describe('The pages of a site manager', () => {
  lookAtPages({ of: 'pages', as: ['site_manager'] });
});
