import { lookAtPages } from './look-at-pages';

describe('What opens on the pages of a site manager', () => {
  lookAtPages({ of: 'states', as: ['site_manager'] });
});
