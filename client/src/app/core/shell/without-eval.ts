import { config } from 'zod';

// zod would try to compile its checks with `new Function`, which the page's policy forbids and reports.
// Imported before any schema is made.
config({ jitless: true });
