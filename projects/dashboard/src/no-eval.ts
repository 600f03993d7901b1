import { config } from 'zod/v4/core';

// Runs before anything else: zod must not try out `eval`, which the page's policy forbids and reports.
config({ jitless: true });
