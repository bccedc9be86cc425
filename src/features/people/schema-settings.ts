import { z } from 'zod';

// The content policy forbids code made at run time, which zod would otherwise try.
z.config({ jitless: true });
