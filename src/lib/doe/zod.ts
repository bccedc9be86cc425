import { z } from 'zod';

// zod would otherwise probe for `new Function`, which the page's content security policy reports as a violation.
z.config({ jitless: true });

export { z };
